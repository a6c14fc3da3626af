/**
 * A cut-out from a few figures: rows of fronts of one width with dividers between them. What the openings cannot take up without a
 * fraction of a micrometre widens the last end, so that fronts meant to be equal are equal.
 */
import { type Um, um } from "../../units/um";
import type { CutOutFace, CutOutPart, Grain } from "../face";
import { MOST_FRONTS } from "../graduate";

export interface CutOutWish {
  readonly grain: Grain;
  /** Finished length of the rail along the grain. */
  readonly length: Um;
  readonly rows: number;
  /** In each row. */
  readonly fronts: number;
  /** Of the openings, across the grain. */
  readonly rowHeight: Um;
  /** Every strip, across the grain. */
  readonly strip: Um;
  /** The fixed part at either end of a row, along the grain. */
  readonly end: Um;
  /** The fixed part between two fronts, along the grain. */
  readonly divider: Um;
  /** Round each front. */
  readonly gap: Um;
  /** As much as the gap where it is not given. */
  readonly fitting?: Um;
  /** Jointed where it is not given. */
  readonly rails?: CutOutFace["rails"];
}

export type FreshCutOut =
  | { readonly ok: true; readonly face: CutOutFace; readonly opening: Um }
  | { readonly ok: false; readonly reason: "bad-count" }
  /** The gaps leave nothing of an opening, which would be this long and high (µm). */
  | { readonly ok: false; readonly reason: "no-room"; readonly opening: number; readonly rowHeight: Um };

export function freshCutOut(wish: CutOutWish): FreshCutOut {
  const { fronts, rows, gap } = wish;
  const counts = [fronts, rows].every((count) => Number.isInteger(count) && count >= 1);
  if (!counts || fronts * rows > MOST_FRONTS) return { ok: false, reason: "bad-count" };
  const room = wish.length - 2 * wish.end - (fronts - 1) * wish.divider;
  const opening = Math.floor(room / fronts);
  if (!(Math.min(opening, wish.rowHeight) > 2 * gap)) return { ok: false, reason: "no-room", opening, rowHeight: wish.rowHeight };
  const between = Array.from({ length: fronts }, (_, index): CutOutPart[] => [
    { kind: "fixed", width: index === 0 ? wish.end : wish.divider },
    { kind: "front", width: um(opening) },
  ]).flat();
  const parts: CutOutPart[] = [...between, { kind: "fixed", width: um(wish.end + room - opening * fronts) }];
  return {
    ok: true,
    opening: um(opening),
    face: {
      pattern: "cutOut",
      grain: wish.grain,
      strips: Array.from({ length: rows + 1 }, () => wish.strip),
      rows: Array.from({ length: rows }, () => ({ height: wish.rowHeight, parts })),
      gap: { left: gap, right: gap, top: gap, bottom: gap },
      fitting: wish.fitting ?? gap,
      rails: wish.rails ?? "jointed",
    },
  };
}
