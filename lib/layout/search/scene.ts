/** A group on one side of a board in one orientation: everything that the places of it have in common. */
import type { FaceLayout, QuarterTurns } from "../pattern/face-layout";
import type { StockId } from "../piece";
import type { SideTables } from "./board-side";
import { endCell, firstCell } from "./grid";
import { type LaidGroup, layGroup, type Phase } from "./laid-group";
import type { TakenCells } from "./largest-rest";
import { seamGround } from "./seam-ground";
import { planSeams, type SeamPlan } from "./seam-plan";
import type { SearchPicture } from "./search-picture";
import { planSymmetry, type SymmetryPlan } from "./symmetry";

export interface Scene {
  readonly side: SideTables;
  readonly laid: LaidGroup;
  readonly seams: SeamPlan;
  readonly symmetry: SymmetryPlan | null;
  /** Cells that are taken with the corner in the first cell. */
  readonly taken: TakenCells;
  /** 0..1, how glad the shop is to use this board. */
  readonly stock: number;
}

/** What a search was asked about, as far as a scene needs it. */
export interface SceneGround {
  readonly layout: FaceLayout;
  readonly groupId: string;
  /** Straightened pictures of the boards that pieces of other groups lie on; the board's own side is known. */
  readonly pictureOf: (stockId: StockId) => SearchPicture | null;
  readonly stock: number;
}

export function makeScene(ground: SceneGround, side: SideTables, turns: QuarterTurns, phase?: Phase): Scene {
  const laid = layGroup(ground.layout, ground.groupId, { stockId: side.board.id, turns, phase });
  const { blank, kerfs } = laid;
  const own = new Set(laid.lying.map(({ id }) => id));
  const pictureOf = (stockId: StockId) => (stockId === side.board.id ? side.picture : ground.pictureOf(stockId));
  return {
    side,
    laid,
    seams: planSeams(seamGround(laid.layout, (id) => own.has(id), pictureOf)),
    symmetry: planSymmetry(laid.lying),
    taken: {
      left: endCell(blank.along.from - kerfs.along),
      right: firstCell(blank.along.to + kerfs.along),
      top: endCell(blank.across.from - kerfs.across),
      bottom: firstCell(blank.across.to + kerfs.across),
    },
    stock: ground.stock,
  };
}

export function countedSeams({ own, fixed }: SeamPlan): number {
  return own.length + fixed.length;
}
