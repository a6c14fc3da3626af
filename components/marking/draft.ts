/**
 * A marking in the making: everything that the screen lets a person enter, complete or not. Pure data and what may be done to it; `marking-of.ts` turns it into
 * what the core takes. Points are pixels of the upright, full-size photograph.
 */
import {
  type BoardEdge,
  type FourCorners,
  type PaperName,
  type PhotoPoint,
  type PhotoSize,
  paperSizes,
  type Um,
} from "@/lib/layout";
import type { Straightening } from "@/lib/schemas/straightening";
import { firstBoardGuess, firstSheetGuess } from "./first-guess";

export interface SheetChoice {
  readonly paper: PaperName | "own";
  /** The short side lies along the sheet's first edge. */
  readonly upright: boolean;
  readonly ownLength: Um | null;
  readonly ownWidth: Um | null;
}

export interface DraftPoint {
  readonly photo: PhotoPoint;
  /** Its true place, from the left end and from the upper edge of what is of known size; null while not entered. */
  readonly x: Um | null;
  readonly y: Um | null;
}

export interface KnownDistance {
  readonly from: PhotoPoint;
  readonly to: PhotoPoint;
  readonly trueLength: Um | null;
}

export interface Draft {
  readonly reference: "board" | "sheet";
  readonly length: Um | null;
  readonly width: Um | null;
  readonly sheet: SheetChoice;
  readonly corners: FourCorners;
  readonly sheetCorners: FourCorners;
  /** Corners nobody has put in their place yet. */
  readonly unplaced: { readonly board: readonly boolean[]; readonly sheet: readonly boolean[] };
  readonly extraPoints: readonly DraftPoint[];
  readonly edgePoints: readonly { readonly photo: PhotoPoint; readonly edge: BoardEdge }[];
  readonly known: KnownDistance | null;
}

const all = (value: boolean) => [value, value, value, value];

/** `length`, `width`: what is written about the board, 0 while nobody has measured. */
export function freshDraft(photo: PhotoSize, board: { length: Um; width: Um }): Draft {
  const length = board.length > 0 ? board.length : null;
  const width = board.width > 0 ? board.width : null;
  return {
    reference: "board",
    length,
    width,
    sheet: { paper: "a4", upright: false, ownLength: null, ownWidth: null },
    corners: firstBoardGuess(photo, length !== null && width !== null ? length / width : null),
    sheetCorners: firstSheetGuess(photo, paperSizes.a4.lengthUm / paperSizes.a4.widthUm),
    unplaced: { board: all(true), sheet: all(true) },
    extraPoints: [],
    edgePoints: [],
    known: null,
  };
}

/** Starts from the marks of an earlier version, made on this photograph. */
export function draftFrom(
  marking: NonNullable<Straightening["marking"]>,
  photo: PhotoSize,
  board: { length: Um; width: Um },
): Draft {
  const fresh = freshDraft(photo, board);
  const { reference } = marking;
  return {
    ...fresh,
    reference: reference.kind,
    ...(reference.kind === "board"
      ? { length: reference.length, width: reference.width }
      : { sheetCorners: reference.corners, sheet: sheetChoiceOf(reference.length, reference.width) }),
    corners: marking.corners,
    unplaced: { board: all(false), sheet: all(reference.kind === "board") },
    extraPoints: marking.extraPoints.map(({ photo: at, at: place }) => ({ photo: at, x: place.x, y: place.y })),
    edgePoints: marking.edgePoints,
  };
}

function sheetChoiceOf(length: Um, width: Um): SheetChoice {
  const upright = length < width;
  const [long, short] = upright ? [width, length] : [length, width];
  const names: readonly PaperName[] = ["a4", "letter"];
  const paper = names.find((name) => paperSizes[name].lengthUm === long && paperSizes[name].widthUm === short);
  if (paper) return { paper, upright, ownLength: null, ownWidth: null };
  return { paper: "own", upright: false, ownLength: length, ownWidth: width };
}

/** True size of the chosen sheet as it was marked, its first edge first; null while not entered. */
export function sheetSize({ paper, upright, ownLength, ownWidth }: SheetChoice): { length: Um; width: Um } | null {
  if (paper === "own") return ownLength !== null && ownWidth !== null ? { length: ownLength, width: ownWidth } : null;
  const { lengthUm, widthUm } = paperSizes[paper];
  return upright ? { length: widthUm, width: lengthUm } : { length: lengthUm, width: widthUm };
}
