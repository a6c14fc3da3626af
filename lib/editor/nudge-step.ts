/** How far one press of an arrow key slides. */
import { type LengthStyle, type Um, um } from "@/lib/layout";

/** 0.5 mm, or 1/64 in (396.875 µm) to the nearest micrometre; ten of them with Shift. */
export function nudgeStep(style: LengthStyle, coarse: boolean): Um {
  const fine = style.unit === "mm" ? 500 : 25_400 / 64;
  return um(Math.round(coarse ? fine * 10 : fine));
}
