/**
 * Boards and leaves in front of the camera, with their knots added to the truth.
 */
import { type BoardOptions, sawBoard } from "./board-face";
import { type Flitch, type LeafSide, type LeafSlip, leafPlane } from "./flitch";
import { type KnotTruth, knotsOnFace } from "./knots-on-face";
import { type Photograph, type PhotoOptions, type PhotoTruth, photographSubject } from "./photograph";
import { planeFace } from "./plane";
import type { Card } from "./subject";

export interface WoodTruth extends PhotoTruth {
  readonly knots: readonly KnotTruth[];
}

export interface WoodPhotograph extends Photograph {
  readonly truth: WoodTruth;
}

export interface BoardPhotoOptions extends BoardOptions, PhotoOptions {
  /** A card of known size lying on the board. */
  readonly card?: Card;
  /** 26 mm unless given. */
  readonly thicknessMm?: number;
}

/** A photograph of a board's show face: the face `boardFace` gives for the same options. */
export function photographBoard(options: BoardPhotoOptions): WoodPhotograph {
  const board = sawBoard(options);
  const photograph = photographSubject(
    {
      ...size(board),
      thicknessMm: options.thicknessMm ?? 26,
      card: options.card,
      render: (pxPerMm) => planeFace(board.log, board.plane, board, pxPerMm),
    },
    options,
  );
  return { ...photograph, truth: { ...photograph.truth, knots: knotsOnFace(board.log, board.plane, board) } };
}

export interface LeafPhotoOptions extends PhotoOptions {
  readonly leaf: number;
  readonly slip?: LeafSlip;
  readonly side?: LeafSide;
}

/** A photograph of one leaf of a flitch: the face `leafFace` gives for the same leaf, slip and side. */
export function photographLeaf(flitch: Flitch, options: LeafPhotoOptions): WoodPhotograph {
  const plane = leafPlane(flitch, options.leaf, options.slip, options.side);
  const photograph = photographSubject(
    { ...size(flitch), thicknessMm: flitch.leafMm, render: (pxPerMm) => planeFace(flitch.log, plane, flitch, pxPerMm) },
    options,
  );
  return { ...photograph, truth: { ...photograph.truth, knots: knotsOnFace(flitch.log, plane, flitch) } };
}

function size({ lengthMm, widthMm }: { readonly lengthMm: number; readonly widthMm: number }) {
  return { lengthMm, widthMm };
}
