/** What a person has entered for the sizes along one axis, and the sizes that follow from it. */
import { type SizeStep, sizesFromOpening, type Um, um, umFromMm } from "@/lib/layout";

export type Axis = "columns" | "rows";

export interface AxisDraft {
  readonly from: "opening" | "hand";
  readonly count: number;
  readonly gap: Um;
  readonly opening: Um;
  readonly outerBefore: Um;
  readonly outerAfter: Um;
  readonly graduation: "equal" | "step" | "ratio";
  readonly step: Um;
  readonly ratio: number;
  /** Entered one by one; the last stands for any that follow. */
  readonly sizes: readonly Um[];
  /** Sizes from an opening are brought down to whole divisions of the shop's rule. */
  readonly sizeStep: SizeStep;
}

export type AxisSizes =
  | { readonly ok: true; readonly sizes: readonly Um[]; readonly gaps: readonly Um[]; readonly remainder: Um }
  | { readonly ok: false; readonly message: string };

/** 0.1 mm and 1/64 in: what the order prints. */
export const sizeStepOf = (units: "mm" | "inch"): SizeStep =>
  units === "mm" ? { um: 100, parts: 1 } : { um: 25_400, parts: 64 };

/** Round figures of the shop's own units, to be overwritten. */
const startingLengths = {
  mm: { columns: umFromMm(1000), rows: umFromMm(180), step: umFromMm(10) },
  inch: { columns: um(40 * 25_400), rows: um(7 * 25_400), step: um(12_700) },
} as const;

export function startingDraft(axis: Axis, units: "mm" | "inch"): AxisDraft {
  // 1/8 in (3 mm) between stacked fronts: general reveal, see the sources of the trade's figures in DEVELOPERS.md.
  const gap = units === "mm" ? umFromMm(3) : um(3175);
  return {
    from: "opening",
    count: axis === "columns" ? 4 : 1,
    gap,
    opening: startingLengths[units][axis],
    outerBefore: gap,
    outerAfter: gap,
    graduation: "equal",
    step: startingLengths[units].step,
    ratio: 1.1,
    sizes: [],
    sizeStep: sizeStepOf(units),
  };
}

export function axisSizes(draft: AxisDraft): AxisSizes {
  const gaps = Array.from({ length: draft.count - 1 }, () => draft.gap);
  if (draft.from === "hand") {
    const sizes = Array.from({ length: draft.count }, (_, index) => draft.sizes[index] ?? draft.sizes.at(-1));
    if (!sizes.every((size) => size !== undefined && size > 0)) return { ok: false, message: "Enter every size." };
    return { ok: true, sizes: sizes.filter((size) => size !== undefined), gaps, remainder: um(0) };
  }
  const { opening, count, gap, outerBefore, outerAfter, sizeStep } = draft;
  const result = sizesFromOpening({ opening, count, gap, outerBefore, outerAfter, sizeStep, graduation: graduationOf(draft) });
  if (result.ok) return { ok: true, sizes: result.sizes, gaps: result.gaps, remainder: result.remainder };
  return { ok: false, message: sayings[result.reason] };
}

const sayings = {
  "no-room": "The opening is too small for so many fronts with these gaps. Make it larger, or take fewer fronts.",
  "bad-count": "At least one front is needed.",
  "bad-ratio": "The ratio has to be more than 0.",
  "bad-size-step": "The sizes cannot be brought to the rule.",
} as const;

function graduationOf(draft: AxisDraft) {
  if (draft.graduation === "step") return { kind: "step", step: draft.step } as const;
  if (draft.graduation === "ratio") return { kind: "ratio", ratio: draft.ratio } as const;
  return { kind: "equal" } as const;
}

/** Goes over to sizes entered one by one, starting from those the opening gave. */
export function draftByHand(draft: AxisDraft): AxisDraft {
  const given = axisSizes(draft);
  return { ...draft, from: "hand", sizes: given.ok ? given.sizes : draft.sizes };
}
