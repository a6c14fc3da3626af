/** What the parts of a cut program are called, and their sizes. */
import { type LengthStyle, type Part, printedLength, type Um } from "@/lib/layout";

/** "front 2", "strip A", "offcut C1", "the board", "waste". */
export function partName(part: Pick<Part, "kind" | "label">): string {
  switch (part.kind) {
    case "board":
      return "the board";
    case "rough":
      return `rough part ${part.label}`;
    case "strip":
      return `strip ${part.label}`;
    case "blank":
    case "piece":
      return `front ${part.label}`;
    case "offcut":
      return `offcut ${part.label}`;
    case "waste":
      return "waste";
  }
}

/** Along the grain × across it, without the unit: the paper says it once for all. */
export function sizeFigures({ width, height }: { readonly width: Um; readonly height: Um }, style: LengthStyle): string {
  return `${printedLength(width, style).figure} × ${printedLength(height, style).figure}`;
}

/** "1–4, 7": labels that count up without a break are drawn together. */
export function labelRanges(labels: readonly string[]): string {
  const runs: { readonly first: string; last: string }[] = [];
  for (const label of labels) {
    const run = runs.at(-1);
    if (run && /^\d+$/.test(label) && Number(label) === Number(run.last) + 1) run.last = label;
    else runs.push({ first: label, last: label });
  }
  return runs.map(({ first, last }) => (first === last ? first : `${first}–${last}`)).join(", ");
}
