/** How the pictures of a board's two faces agree, in plain words. */
import { type LengthStyle, printLength, type SidesCheck, type Um, um } from "@/lib/layout";

/** Only for pictures that do not agree. */
export function sidesWords({ lengthBy, widthBy }: Pick<SidesCheck, "lengthBy" | "widthBy">, style: LengthStyle): string {
  const by = (amount: Um, more: string, less: string) =>
    amount === 0 ? [] : [`${printLength(um(Math.abs(amount)), style)} ${amount > 0 ? more : less}`];
  const off = [...by(lengthBy, "longer", "shorter"), ...by(widthBy, "wider", "narrower")].join(" and ");
  return `The back comes out ${off} than the face. Check the sizes and corners of both: a knot carried from one side to the other would lie that far off.`;
}
