/** The parts that the value of a place is made of, in the order in which they are shown. */
import type { PartName } from "@/lib/layout";

export const placeParts = ["match", "step", "symmetry", "clear", "rest", "stock"] as const satisfies readonly PartName[];
