/** A blank in the making: which boards, in which order, each how. Pure. */
import { type BlankMember, type Um, um } from "@/lib/layout";
import type { PlanBlank } from "@/lib/schemas/blank";
import type { BoardRow } from "@/lib/schemas/board";
import type { BoardSide, Straightening } from "@/lib/schemas/straightening";

export interface DraftMember {
  readonly board: BoardRow;
  /** Which of its faces comes up. */
  readonly side: BoardSide;
  readonly endForEnd: boolean;
  readonly along: Um;
  readonly trim: { readonly upper: Um; readonly lower: Um };
}

export interface BlankDraft {
  /** From the upper edge down. */
  readonly members: readonly DraftMember[];
  readonly jointing: Um;
  readonly place: string;
  readonly note: string;
}

export const freshBlank = (boards: readonly BoardRow[], jointing: Um): BlankDraft => ({
  members: boards.map(freshMember),
  jointing,
  place: "",
  note: "",
});

const zero = um(0);

const freshMember = (board: BoardRow): DraftMember => ({
  board,
  side: "face",
  endForEnd: false,
  along: zero,
  trim: { upper: zero, lower: zero },
});

export const withBoard = (draft: BlankDraft, board: BoardRow): BlankDraft =>
  draft.members.some((member) => member.board.id === board.id)
    ? draft
    : { ...draft, members: [...draft.members, freshMember(board)] };

export const withoutBoard = (draft: BlankDraft, boardId: string): BlankDraft =>
  flush({ ...draft, members: draft.members.filter(({ board }) => board.id !== boardId) });

/** One place up (−1) or down (1); nothing happens at the ends. */
export function shiftedBoard(draft: BlankDraft, boardId: string, by: -1 | 1): BlankDraft {
  const from = draft.members.findIndex(({ board }) => board.id === boardId);
  const to = from + by;
  const member = draft.members[from];
  if (!member || to < 0 || to >= draft.members.length) return draft;
  return { ...draft, members: draft.members.toSpliced(from, 1).toSpliced(to, 0, member) };
}

export const changedMember = (draft: BlankDraft, boardId: string, change: Partial<Omit<DraftMember, "board">>): BlankDraft =>
  flush({
    ...draft,
    members: draft.members.map((member) => (member.board.id === boardId ? { ...member, ...change } : member)),
  });

/** The board farthest left begins the blank: the others lie so far in from there. */
function flush(draft: BlankDraft): BlankDraft {
  const left = Math.min(...draft.members.map(({ along }) => along));
  if (left === 0 || draft.members.length === 0) return draft;
  return { ...draft, members: draft.members.map((member) => ({ ...member, along: um(member.along - left) })) };
}

/** The picture that shows the side of the board that comes up; null where there is none. */
export const pictureOf = ({ board, side }: DraftMember): string | null =>
  side === "back" ? board.backStraighteningId : board.straighteningId;

/** As the core takes it, with what was drawn on the picture. */
export function memberForCore(member: DraftMember, { length, width, zones }: Straightening): BlankMember {
  const { board, endForEnd, along, trim } = member;
  return {
    id: board.id,
    length,
    width,
    thickness: board.thickness,
    outline: zones.outline,
    keepClear: zones.keepClear,
    glueLines: zones.glueLines.map(({ across }) => across),
    endForEnd,
    along,
    trim,
  };
}

/** As it is sent; null while a board has no picture of the side that comes up. */
export function planOf({ members, jointing, place, note }: BlankDraft): PlanBlank | null {
  const sent = members.flatMap((member) => {
    const straighteningId = pictureOf(member);
    const { board, endForEnd, along, trim } = member;
    return straighteningId === null ? [] : [{ boardId: board.id, straighteningId, endForEnd, along, trim }];
  });
  return sent.length === members.length ? { members: sent, jointing, place, note } : null;
}
