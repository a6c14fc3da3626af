/** The step of the shop's rule: what a printed length goes by. */
import type { SizeStep } from "../pattern/graduate";
import { type LengthStyle, UM_PER_INCH } from "./length-style";

export const ruleStepOf = (style: LengthStyle): SizeStep =>
  style.unit === "mm" ? { um: 100, parts: 1 } : { um: UM_PER_INCH, parts: style.denominator };
