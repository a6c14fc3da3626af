/** A board on the layout table: what the core needs of it, and what the screen shows of it. */
import type { BoardFace } from "@/lib/layout";
import type { Layout } from "@/lib/schemas/layout";

export type LayoutBoard = Layout["boards"][number];

/** One stored size of the straightened picture. */
export interface PictureLevel {
  readonly url: string;
  readonly widthPx: number;
  readonly heightPx: number;
}

export interface TableBoard {
  readonly face: BoardFace;
  readonly tag: string;
  readonly species: string;
  readonly place: string;
  /** The version of the picture that this layout lies on. */
  readonly straighteningId: string;
  readonly version: number;
  readonly side: LayoutBoard["straightening"]["side"];
  /** A newer picture of the same side. */
  readonly newerStraighteningId: string | null;
  readonly otherSideStraighteningId: string | null;
  readonly heldBy: LayoutBoard["heldBy"];
  /** The same wood as in `face`, with whose it is. */
  readonly spokenFor: LayoutBoard["spokenFor"];
  readonly inBlank: LayoutBoard["inBlank"];
  readonly takenBy: LayoutBoard["takenBy"];
  /** Largest first. All cover the whole board. */
  readonly levels: readonly PictureLevel[];
}

export function tableBoard(board: LayoutBoard): TableBoard {
  const { straightening } = board;
  const levels = [...straightening.levels].sort((p, q) => q.widthPx - p.widthPx || (p.url < q.url ? -1 : 1));
  return {
    face: {
      id: board.boardId,
      length: straightening.length,
      width: straightening.width,
      thickness: board.thickness,
      outline: straightening.zones.outline,
      keepClear: straightening.zones.keepClear,
      spokenFor: board.spokenFor,
      glueLines: straightening.zones.glueLines.map(({ across }) => across),
    },
    tag: board.tag,
    species: board.species,
    place: board.place,
    straighteningId: straightening.id,
    version: straightening.version,
    side: straightening.side,
    newerStraighteningId: board.newerStraighteningId,
    otherSideStraighteningId: board.otherSideStraighteningId,
    heldBy: board.heldBy,
    spokenFor: board.spokenFor,
    inBlank: board.inBlank,
    takenBy: board.takenBy,
    levels,
  };
}
