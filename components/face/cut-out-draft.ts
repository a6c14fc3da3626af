/** A new cut-out: what is entered, and the face that follows. */
import { freshCutOut, mmFromUm, type Um, um, umFromMm } from "@/lib/layout";
import type { DraftedFace } from "./face-draft";

export interface CutOutDraft {
  readonly length: Um;
  readonly rows: number;
  readonly fronts: number;
  readonly rowHeight: Um;
  readonly strip: Um;
  readonly end: Um;
  readonly divider: Um;
  readonly gap: Um;
  readonly fitting: Um;
  readonly rails: "jointed" | "fromSaw";
}

export function startingCutOut(units: "mm" | "inch"): CutOutDraft {
  const of = (mm: number, inches: number) => (units === "mm" ? umFromMm(mm) : um(Math.round(inches * 25_400)));
  return {
    length: of(1200, 48),
    rows: 1,
    fronts: 3,
    rowHeight: of(100, 4),
    strip: of(35, 1.5),
    end: of(60, 2.5),
    divider: of(30, 1.25),
    gap: of(1.5, 1 / 16),
    fitting: of(0.5, 1 / 64),
    rails: "jointed",
  };
}

export function cutOutFace(draft: CutOutDraft, grain: "horizontal" | "vertical"): DraftedFace {
  const fresh = freshCutOut({ ...draft, grain });
  if (fresh.ok) return { ok: true, face: fresh.face };
  if (fresh.reason === "bad-count") return { ok: false, message: "At least one row and one front in it are needed." };
  const { opening, rowHeight } = fresh;
  if (rowHeight <= 2 * draft.gap) {
    return { ok: false, message: "The gaps take all of the opening's height. Make the rows higher, or the gaps smaller." };
  }
  const missing = mmFromUm(um(Math.ceil(2 * draft.gap - opening)));
  return {
    ok: false,
    message: `The rail is too short for so many fronts: each opening lacks ${missing.toFixed(1)} mm and more. Make it longer, or take fewer fronts.`,
  };
}
