/** The show side: the face as it will hang, every piece painted from the photograph of its board. A piece whose wood has not moved keeps its picture. */
import type { StaticCanvas } from "fabric";
import { type FaceLayout, faceSize, type LengthStyle, type Piece, type PieceId, rectToStock, type Seam } from "@/lib/layout";
import { factsOf } from "../selectors/facts";
import type { TableBoard } from "../table-board";
import type { TableGeometry } from "../view/geometry";
import { glueSegments } from "../view/glue-segments";
import { CHIP_SIZE, chipHeight, jumpChips } from "../view/jump-chips";
import { chip } from "./marks/chip";
import { glueLine } from "./marks/glue-lines";
import { paintJump } from "./marks/jump-chip";
import { chalkLines } from "./marks/piece-mark";
import { paintPatch } from "./marks/wood";
import type { Palette } from "./palette";
import type { PictureAtHand, Pictures } from "./pictures";
import type { Box } from "./sketch";
import { Sketches } from "./sketches";

export interface ShowLook {
  readonly layout: FaceLayout;
  readonly boards: readonly TableBoard[];
  readonly selection: readonly PieceId[];
  readonly showTriangle: boolean;
  readonly dragging: boolean;
  readonly style: LengthStyle;
}

/** Width of the dark frame around the face, px: the case it hangs in. */
const FRAME_PX = 6;

export class ShowLayer {
  readonly #sketches: Sketches;
  /** What each piece was last painted from; painted again only when that differs. */
  #painted = new Map<PieceId, string>();
  #pictureNumbers = new WeakMap<ImageBitmap, number>();
  #pictures = 0;

  constructor(canvas: StaticCanvas) {
    this.#sketches = new Sketches(canvas);
  }

  sync(look: ShowLook, geometry: TableGeometry, pictures: Pictures, palette: Palette): void {
    const { layout } = look;
    const { facePieces, pieceById, triangle, seams } = factsOf(layout);
    const px = geometry.showPxPerMm / 1000;
    const { x: left, y: top } = geometry.showOrigin;
    const size = faceSize(layout.face);
    const [width, height] = [size.width * px, size.height * px];
    const frame: Box = { left: left - FRAME_PX, top: top - FRAME_PX, width: width + 2 * FRAME_PX, height: height + 2 * FRAME_PX };
    this.#sketches.named("frame").put(frame, (context, box) => {
      context.fillStyle = palette.gap;
      context.fillRect(0, 0, box.width, box.height);
    });
    for (const { id, rect } of facePieces) {
      const box = { left: left + rect.x * px, top: top + rect.y * px, width: rect.width * px, height: rect.height * px };
      this.#piece(id, box, pieceById.get(id), rect, look.boards, geometry, pictures, palette);
    }
    const overlay: Box = { left, top, width, height };
    const chosen = facePieces.filter(({ id }) => look.selection.includes(id));
    // A line around every front would hide the seams, which are what one looks at.
    const outlined = look.dragging || chosen.length === facePieces.length ? [] : chosen;
    const joined = facePieces.flatMap(({ id, rect }) => {
      const piece = pieceById.get(id);
      const board = piece && look.boards.find(({ face }) => face.id === piece.stockId);
      return piece && board ? glueSegments(piece, rect, board.face.glueLines) : [];
    });
    this.#sketches.named("overlay").put(overlay, (context) => {
      for (const { from, to } of joined) {
        glueLine(context, { x1: from.x * px, y1: from.y * px, x2: to.x * px, y2: to.y * px }, palette);
      }
      for (const { rect } of outlined) {
        context.strokeStyle = palette.white;
        context.lineWidth = 4;
        context.strokeRect(rect.x * px, rect.y * px, rect.width * px, rect.height * px);
        context.strokeStyle = palette.chalk;
        context.lineWidth = 2;
        context.strokeRect(rect.x * px, rect.y * px, rect.width * px, rect.height * px);
      }
      if (look.showTriangle) {
        const lines = [...triangle.values()].flatMap(({ segments }) =>
          segments.map(({ from, to }) => ({ x1: from.x * px, y1: from.y * px, x2: to.x * px, y2: to.y * px })),
        );
        chalkLines(context, lines, [], palette);
      }
      for (const { id, label, rect } of facePieces) {
        const piece = { left: rect.x * px, top: rect.y * px, width: rect.width * px, height: rect.height * px };
        chip(
          context,
          piece,
          label,
          { fill: look.selection.includes(id) ? palette.chalk : "rgb(32 38 42 / 0.8)", ink: palette.white },
          palette,
        );
      }
    });
    for (const [index, { x, y, lines, jumps }] of jumpChips(
      told(seams, look, facePieces.length),
      pieceById,
      size,
      geometry,
      look.style,
    ).entries()) {
      const tall = chipHeight({ lines });
      const box = { left: left + x - CHIP_SIZE.width / 2, top: top + y - tall / 2, width: CHIP_SIZE.width, height: tall };
      this.#sketches.named(`jump ${index}`).put(box, paintJump(lines, jumps, palette));
    }
    this.#sketches.settle();
  }

  #piece(
    id: PieceId,
    box: Box,
    piece: Piece | undefined,
    rect: Parameters<typeof rectToStock>[1],
    boards: readonly TableBoard[],
    geometry: TableGeometry,
    pictures: Pictures,
    palette: Palette,
  ): void {
    const sketch = this.#sketches.named(id, true);
    const board = piece && boards.find(({ face }) => face.id === piece.stockId);
    const picture: PictureAtHand =
      board === undefined ? { state: "missing" } : pictures.at(board, geometry.showPxPerMm * window.devicePixelRatio);
    const from = JSON.stringify([box.width, box.height, piece?.stockFromFace ?? null, this.#numberOf(picture)]);
    if (this.#painted.get(id) === from) {
      sketch.shift(box.left, box.top);
      return;
    }
    this.#painted.set(id, from);
    if (piece === undefined || board === undefined) {
      sketch.put(box, paintBlank(palette));
      return;
    }
    const stockRect = rectToStock(piece.stockFromFace, rect);
    sketch.put(box, paintPatch(picture, piece.stockFromFace, rect, stockRect, geometry.showPxPerMm / 1000, palette));
  }

  #numberOf(picture: PictureAtHand): string | number {
    if (picture.state !== "ready") return picture.state;
    const { bitmap } = picture.wood;
    const known = this.#pictureNumbers.get(bitmap);
    if (known !== undefined) return known;
    this.#pictures += 1;
    this.#pictureNumbers.set(bitmap, this.#pictures);
    return this.#pictures;
  }
}

/**
 * The seams whose jump is written down. A cut-out has a dozen on a hand's breadth of wood, and chips on all of them would hide it: there only those
 * of the parts that are chosen, and none while everything is.
 */
function told(seams: readonly Seam[], { layout, selection }: ShowLook, count: number): readonly Seam[] {
  if (layout.face.pattern !== "cutOut") return seams;
  if (selection.length === count) return [];
  return seams.filter(({ a, b }) => selection.includes(a) || selection.includes(b));
}

/** A piece that has no wood yet. */
function paintBlank(palette: Palette): (context: CanvasRenderingContext2D, box: Box) => void {
  return (context, { width, height }) => {
    context.fillStyle = palette.rule;
    context.fillRect(0, 0, width, height);
    context.font = `500 14px ${palette.measure}`;
    context.fillStyle = palette.graphite;
    context.textBaseline = "middle";
    context.textAlign = "center";
    if (width > 70 && height > 60) context.fillText("no wood yet", width / 2, height / 2);
    context.textAlign = "start";
  };
}
