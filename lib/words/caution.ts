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
