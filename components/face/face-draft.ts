/** What a person has entered for a new face, by pattern, and the face that follows from it. */
import type { Face } from "@/lib/layout";

export type DraftedFace = { readonly ok: true; readonly face: Face } | { readonly ok: false; readonly message: string };

export type FaceKind = Face["pattern"];

/** In the order in which they are offered. */
export const faceKinds = [
  { value: "grid", label: "Fronts with gaps", hint: "A row, a stack or a grid of fronts from one run of figure." },
  {
    value: "cutOut",
    label: "Fronts out of a rail",
    hint: "Fronts cut from a solid rail or panel and set back into it; the rail is glued up round them.",
  },
  { value: "wrap", label: "Round corners", hint: "A run that goes round corners: case sides and top, an apron, a box." },
  { value: "resawn", label: "Opened like a book", hint: "A thick board resawn, its two sawn faces hung as mirror images." },
] as const satisfies readonly { value: FaceKind; label: string; hint: string }[];

export interface FieldsProps<Draft> {
  draft: Draft;
  onChange: (draft: Draft) => void;
}
