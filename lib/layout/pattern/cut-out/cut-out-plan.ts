/**
 * What the bench is told of a cut-out beside the cuts: the wood it takes, what each crosscut costs, how far every fixed part and
 * strip is moved for gluing up, the openings, and how the fronts are trimmed. Worked out from the spaced chart as if the whole face
 * lay in one piece of wood, so it is known before a board is chosen. Lengths in µm, face frame.
 */
import type { PieceId } from "../../piece";
import { type Um, um } from "../../units/um";
import { faceAnchor, spacedAnchor } from "../anchor";
import { hungChart, spacedChart } from "../charts";
import type { CutOutFace, EdgeAmounts } from "../face";
import type { FaceLayout } from "../face-layout";
import type { PieceSize } from "../layout-change";
import { ofPiece } from "../piece-ids";
import { pieceIdAt } from "../piece-names";
import { rulesOf } from "../rules-of";
import { slotOf } from "../slots";
import { type WoodNeeded, woodNeeded } from "../wood-needed";
import { cutsOfRow, lossAcross, type RowCut } from "./cut-out-losses";
import { indexOfPart, piecesOfCutOut } from "./cut-out-pieces";
import { rectOnFace } from "./rail-axes";

/** Where a part is glued, against the place it was cut from: along the strips and across them, positive towards the end and the bottom. */
export interface GluingShift {
  readonly piece: PieceId;
  readonly role: "fixed" | "strip";
  /** null where the piece does not lie with the set: then no mark across the cuts can show the way. */
  readonly shift: { readonly along: Um; readonly across: Um } | null;
}

export interface CutOutCrosscut extends RowCut {
  readonly row: number;
  readonly a: PieceId;
  readonly b: PieceId;
  /** Taken out beside the cut as waste, so that the figure follows the gap; 0 where the loss fills it. */
  readonly sliver: Um;
}

export interface CutOutOpening extends PieceSize {
  readonly row: number;
  readonly part: number;
  readonly front: PieceId;
}

export interface TrimmedFront {
  readonly front: PieceId;
  /** As it leaves the saw. */
  readonly sawn: PieceSize;
  readonly trim: EdgeAmounts;
  readonly finished: PieceSize;
}

export interface CutOutPlan {
  readonly wood: WoodNeeded;
  /** Finished outside size of the glued-up face. */
  readonly outside: PieceSize;
  /** Between a strip and the row beside it. */
  readonly ripLoss: Um;
  readonly crosscuts: readonly CutOutCrosscut[];
  readonly shifts: readonly GluingShift[];
  readonly openings: readonly CutOutOpening[];
  readonly fronts: readonly TrimmedFront[];
}

/** null for a face of another pattern. */
export function cutOutPlan(layout: FaceLayout): CutOutPlan | null {
  const { face } = layout;
  if (face.pattern !== "cutOut") return null;
  const settings = { ...layout, face };
  return {
    wood: woodNeeded(layout),
    outside: rulesOf(face).size(face),
    ripLoss: lossAcross(settings),
    crosscuts: face.rows.flatMap((_, row) =>
      cutsOfRow(settings, row).map((cut, part) => {
        const a = indexOfPart(face, row, part);
        return { ...cut, row, a: pieceIdAt(a), b: pieceIdAt(a + 1), sliver: um(cut.spacing - cut.loss) };
      }),
    ),
    shifts: shiftsOf(layout, face),
    openings: openingsOf(face),
    fronts: frontsOf(layout, face),
  };
}

function shiftsOf(layout: FaceLayout, face: CutOutFace): GluingShift[] {
  const [set] = layout.groups;
  const [hung, places] = [hungChart(face), spacedChart(layout)];
  const anchored = set !== undefined && set.pieceIds.length > 0;
  const [onFace, inWood] = anchored ? [faceAnchor(layout, set), spacedAnchor(layout, set)] : [null, null];
  return piecesOfCutOut(face).flatMap(({ role }, index): GluingShift[] => {
    if (role === "front") return [];
    const piece = pieceIdAt(index);
    if (onFace === null || inWood === null || !set?.pieceIds.includes(piece)) return [{ piece, role, shift: null }];
    const [at, from] = [ofPiece(hung, piece).rect, ofPiece(places, slotOf(set, piece)).rect];
    const right = um(at.x - onFace.x - (from.x - inWood.x));
    const down = um(at.y - onFace.y - (from.y - inWood.y));
    const shift = face.grain === "horizontal" ? { along: right, across: down } : { along: down, across: right };
    return [{ piece, role, shift }];
  });
}

function openingsOf(face: CutOutFace): CutOutOpening[] {
  return face.rows.flatMap(({ height, parts }, row) =>
    parts.flatMap(({ kind, width }, part) => {
      if (kind === "fixed") return [];
      const opening = rectOnFace(face.grain, { start: 0, size: width }, { start: 0, size: height });
      const front = pieceIdAt(indexOfPart(face, row, part));
      return [{ row, part, front, width: opening.width, height: opening.height }];
    }),
  );
}

function frontsOf(layout: FaceLayout, face: CutOutFace): TrimmedFront[] {
  const cleanUps = rulesOf(face).cleanUps({ ...layout, face });
  return hungChart(face).flatMap(({ role, rect: { width, height } }, index) => {
    const front = pieceIdAt(index);
    if (role !== "front") return [];
    const trim = ofPiece(cleanUps, front);
    const sawn = { width: um(width + trim.left + trim.right), height: um(height + trim.top + trim.bottom) };
    return [{ front, sawn, trim, finished: { width, height } }];
  });
}
