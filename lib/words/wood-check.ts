/** The check under a cut order: where the wood of a board goes, in figures that add up as printed. */
import { conservationLine, type LengthStyle, printedLength, um } from "@/lib/layout";
import type { SnapshotBoard } from "@/lib/schemas/order-snapshot";

type Sum = NonNullable<ReturnType<typeof conservationLine>>["area"];

/** µm² in a square centimetre and a square inch. */
const squareCentimetre = 1e8;
const squareInch = 25_400 ** 2;

const names: readonly (readonly [keyof Omit<Sum, "board">, string])[] = [
  ["fronts", "fronts"],
  ["kerf", "kerf"],
  ["slivers", "slivers"],
  ["cleanUp", "clean-up"],
  ["offcuts", "offcuts"],
  ["waste", "waste"],
];

/** One line for the areas and, where all fronts are one strip, one for the lengths along it. */
export function woodCheck({ program }: SnapshotBoard, style: LengthStyle): string[] {
  const line = conservationLine(program);
  if (!line) return [];
  const [unit, per] = style.unit === "mm" ? ["cm²", squareCentimetre] : ["square inches", squareInch];
  // Tenths, so that the parts and the whole are rounded alike.
  const area = sentence("By area", line.area, per / 10, (count) => (count / 10).toFixed(1), unit);
  if (!line.length) return [area];
  const step = style.unit === "mm" ? 100 : 25_400 / style.denominator;
  const figure = (count: number) => printedLength(um(Math.round(count * step)), style).figure;
  return [area, sentence("Along the strip", line.length, step, figure, style.unit === "mm" ? "mm" : "inches")];
}

function sentence(what: string, sum: Sum, step: number, print: (count: number) => string, unit: string): string {
  const shares = names.map(([key, name]) => ({ name, size: sum[key] })).filter(({ size }) => size > 0);
  const counts = roundedToSum(
    shares.map(({ size }) => size / step),
    Math.round(sum.board / step),
  );
  const parts = shares.map(({ name }, i) => `${name} ${print(counts[i] ?? 0)}`);
  return `${what}: ${parts.join(" + ")} = board ${print(Math.round(sum.board / step))} ${unit}.`;
}

/** Whole numbers near the given ones that add up to the total: the largest remainders are rounded up, the first of equal ones first. */
export function roundedToSum(values: readonly number[], total: number): number[] {
  const whole = values.map(Math.floor);
  let missing = total - whole.reduce((sum, value) => sum + value, 0);
  const byRemainder = values
    .map((value, index) => ({ index, rest: value - Math.floor(value) }))
    .sort((a, b) => b.rest - a.rest || a.index - b.index);
  for (const { index } of byRemainder) {
    if (missing <= 0) break;
    whole[index] = (whole[index] ?? 0) + 1;
    missing -= 1;
  }
  return whole;
}
