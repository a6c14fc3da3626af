/** The usual cautions in words. They remind; they do not teach. */
import type { Caution } from "@/lib/layout";

export const cautionWords: Readonly<Record<Caution, string>> = {
  "short-crosscut-clamp": "Short part: clamp it to the gauge, hands well clear of the blade.",
  "narrow-rip-push-stick": "Narrow rip: use a push stick.",
  "guard-and-riving-knife": "Guard and riving knife on.",
  "offcut-not-between-fence-and-blade":
    "Cut to a mark, blade on its waste side. No fence or stop there: what comes off would be caught.",
  "too-short-for-planer": "Too short for jointer and planer: clean it up by hand.",
  "no-machine": "No saw of the shop is said to take this cut: choose a safe way before you begin.",
  "not-flat": "The board is not flat yet and can rock and bind: support it, and keep it off a saw table if you can.",
};

/** Printed on every order and shown with every step that has a caution. */
export const firstOfAll = "The machine's manual, local rules and trained practice come first.";

/** Jointing by machine: bridge guard and push blocks as HSE's sheet WIS17 (revision 2) on planing machines asks for. */
export const jointingCaution = "Jointer: bridge guard over the cutter block, push blocks for short or narrow boards.";

/** Said with every glue; what it is made of only its maker knows. */
export const gluingCautions: readonly string[] = [
  "Glue by its maker's instructions: skin, air, open time, clamping time, warmth.",
  "Clamps are heavy and pinch: two people for a long blank.",
];

/** Common practice, no source, but for the guard and riving knife, which HSE's sheet WIS16 (revision 2) asks for at every job. */
export const bevelCautions: readonly string[] = [
  "Guard and riving knife set for the tilted blade.",
  "Show face up where the blade tilts away from the fence, and no fence where the offcut could be caught under the blade.",
  "Short part: clamp it to the gauge, hands well clear of the blade.",
];

/** Common practice, no source. */
export const resawCautions: readonly string[] = [
  "Resawing: high fence, feather board, guides down to the wood, push block at the end of the cut.",
  "Check that blade and motor take this height, and let the blade set the pace.",
];
