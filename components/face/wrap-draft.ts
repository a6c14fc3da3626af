/** A new run round corners: what is entered, and the face that follows. */
import { faceFaults, freshWrap, type Um, um, umFromMm, type WrapCorner } from "@/lib/layout";
import type { DraftedFace } from "./face-draft";

export interface WrapDraft {
  /** Shown lengths along the run. */
  readonly sides: readonly Um[];
  readonly height: Um;
  readonly thickness: Um;
  readonly closed: boolean;
  readonly corner: WrapCorner;
}

export function startingWrap(units: "mm" | "inch"): WrapDraft {
  const of = (mm: number, inches: number) => (units === "mm" ? umFromMm(mm) : um(Math.round(inches * 25_400)));
  return {
    sides: [of(400, 16), of(900, 36), of(400, 16)],
    height: of(120, 5),
    thickness: of(20, 0.75),
    closed: false,
    corner: { kind: "mitre", turnDeg: 90, parting: "squareThenBevels" },
  };
}

export function wrapFace({ corner, ...draft }: WrapDraft, grain: "horizontal" | "vertical"): DraftedFace {
  const face = freshWrap({ ...draft, grain, corner });
  const [fault] = faceFaults(face);
  return fault ? { ok: false, message: "These sides and corners do not go together. Look at the sizes." } : { ok: true, face };
}
