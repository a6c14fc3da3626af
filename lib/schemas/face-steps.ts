/** The steps of a cut order that follow from the pattern of its face: before the first cut, and once all pieces are cut and cleaned up. */
import type { FaceWork, ResawWork, RunWork, SetBack } from "./face-work";

export type FaceStepBody =
  /** Lines across the cuts to come: what parts are glued back by. */
  | { readonly kind: "gauge-lines"; readonly work: SetBack }
  | { readonly kind: "resaw"; readonly work: ResawWork }
  /** Both ends at one corner. */
  | { readonly kind: "bevel"; readonly work: RunWork; readonly corner: RunWork["corners"][number] }
  /** The fixed parts of one row and the strips on either side of it. */
  | { readonly kind: "set-back"; readonly work: SetBack; readonly row: number }
  | { readonly kind: "fit"; readonly work: SetBack; readonly row: number };

export type FaceStep = FaceStepBody & { readonly id: string };

/** Before anything is cut. `face`: its place in the order, from 1. */
export function stepsBeforeCutting(work: FaceWork, face: number): FaceStep[] {
  return work.pattern === "cutOut" ? [{ id: `face-${face}:gauge-lines`, kind: "gauge-lines", work }] : [];
}

/** Once all its pieces are cut and cleaned up. */
export function stepsAfterCutting(work: FaceWork, face: number): FaceStep[] {
  const id = (name: string) => `face-${face}:${name}`;
  switch (work.pattern) {
    case "resawn":
      return [{ id: id("resaw"), kind: "resaw", work }];
    case "wrap":
      return work.corners.flatMap((corner, index): FaceStep[] =>
        corner.bevelDeg === 0 ? [] : [{ id: id(`bevel-${index + 1}`), kind: "bevel", work, corner }],
      );
    case "cutOut":
      return [
        ...work.rows.map((_, row): FaceStep => ({ id: id(`set-back-${row + 1}`), kind: "set-back", work, row })),
        ...work.rows.map((_, row): FaceStep => ({ id: id(`fit-${row + 1}`), kind: "fit", work, row })),
      ];
  }
}
