/** A new pair of leaves from resawn stock: what is entered, and the face that follows. */
import { faceFaults, type ResawnFace, um, umFromMm } from "@/lib/layout";
import type { DraftedFace } from "./face-draft";

export type ResawnDraft = Pick<ResawnFace, "leaf" | "opens" | "resaw" | "leanDeg">;

export function startingResawn(units: "mm" | "inch"): ResawnDraft {
  const of = (mm: number, inches: number) => (units === "mm" ? umFromMm(mm) : um(Math.round(inches * 25_400)));
  return {
    leaf: { width: of(300, 12), height: of(180, 7), thickness: of(8, 5 / 16) },
    opens: "side",
    // A band saw takes 1.3 to 1.6 mm at resawing (common practice, no source); one 1/32 in pass should clear a good resawn face (a magazine's test).
    resaw: { kerf: of(1.5, 1 / 16), planing: of(0.8, 1 / 32) },
    leanDeg: null,
  };
}

export function resawnFace(draft: ResawnDraft, grain: "horizontal" | "vertical"): DraftedFace {
  const face: ResawnFace = { pattern: "resawn", ...draft, grain };
  const [fault] = faceFaults(face);
  return fault ? { ok: false, message: "These sizes do not go together. Look at the leaves." } : { ok: true, face };
}
