/** What becomes of each part that a cut leaves, for the hands that hold it. */
import type { CutStep, Part } from "@/lib/layout";
import { partName } from "./part-name";

export interface YieldRole {
  readonly role: "You get" | "Stays in hand" | "Goes to the rack" | "Falls off";
  readonly name: string;
  readonly part: Part;
}

/** What is wanted first, waste last; otherwise in the order of the program. */
export function yieldRoles(cut: CutStep): readonly YieldRole[] {
  const roles = cut.yields.map((part): YieldRole => ({ role: roleOf(part, cut), name: capital(partName(part)), part }));
  return order.flatMap((role) => roles.filter((one) => one.role === role));
}

const order: readonly YieldRole["role"][] = ["You get", "Stays in hand", "Goes to the rack", "Falls off"];

function roleOf(part: Part, cut: CutStep): YieldRole["role"] {
  if (part.kind === "waste") return "Falls off";
  if (part.kind === "offcut") return "Goes to the rack";
  return partName(part) === partName(cut.part) ? "Stays in hand" : "You get";
}

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
