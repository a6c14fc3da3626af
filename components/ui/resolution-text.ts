/** How finely a picture shows the wood, in the shop's units: `3.28 px/mm`, `83 px/in`. */
import type { LengthStyle } from "@/lib/layout";

const MM_PER_INCH = 25.4;

export const resolutionText = (pxPerMm: number, { unit }: LengthStyle): string =>
  unit === "mm" ? `${pxPerMm.toFixed(2)} px/mm` : `${(pxPerMm * MM_PER_INCH).toFixed(0)} px/in`;
