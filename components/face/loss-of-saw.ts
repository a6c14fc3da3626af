/** The loss a saw's cut is reckoned with. */
import { type CutLoss, um } from "@/lib/layout";
import type { Saw } from "@/lib/schemas/shop";

/** Both edges of a cut get the saw's clean-up. Without a saw nothing is lost, which the face's form does not allow. */
export function lossOfSaw(saw: Saw | undefined): CutLoss {
  const cleanUp = saw?.cleanUp ?? um(0);
  return { kerf: saw?.kerf ?? um(0), cleanUpBefore: cleanUp, cleanUpAfter: cleanUp };
}
