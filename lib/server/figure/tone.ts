/** How far apart two colours look: CIEDE2000, by the colour library. About 1 can just be told side by side; common practice, no source. */
import "server-only";
import { differenceCiede2000, modeLab65, modeRgb, useMode as register } from "culori/fn";
import type { MeanColour } from "@/lib/layout";

// The colour spaces on the way from sRGB to the difference: this door of the library brings none by itself.
register(modeRgb);
register(modeLab65);

const difference = differenceCiede2000();

export function toneBetween(a: MeanColour, b: MeanColour): number {
  return difference(colour(a), colour(b));
}

function colour([r, g, b]: MeanColour) {
  return { mode: "rgb", r: r / 255, g: g / 255, b: b / 255 } as const;
}
