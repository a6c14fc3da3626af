/** The upper layer of the stock side: the pieces as they lie, what the cuts around them take, and the line that a drag has snapped to. */
import type { StaticCanvas } from "fabric";
import { boundsOf, cleanUpEdges, type EdgeAmounts, type PieceId, polygonToStock, type StockRect } from "@/lib/layout";
import { factsOf } from "../selectors/facts";
import type { Preview, SlidePreview } from "../tools/drag";
import type { TableGeometry } from "../view/geometry";
import { type LossBand, paintLoss } from "./marks/loss-bands";
import { type LinePx, paintPiece } from "./marks/piece-mark";
import type { Palette } from "./palette";
import type { Box } from "./sketch";
import { Sketches } from "./sketches";

export interface PiecesLook {
  readonly layout: Preview["layout"];
  readonly selection: readonly PieceId[];
  readonly trouble: ReadonlySet<PieceId>;
  readonly showTriangle: boolean;
  readonly preview: Preview | null;
}

export class PiecesLayer {
  readonly #sketches: Sketches;
  readonly #canvas: StaticCanvas;

  constructor(canvas: StaticCanvas) {
    this.#canvas = canvas;
    this.#sketches = new Sketches(canvas);
  }

  sync(look: PiecesLook, geometry: TableGeometry, palette: Palette): void {
    const { layout, selection, trouble } = look;
    const { pieces, triangle } = factsOf(layout);
    const px = geometry.stockPxPerMm / 1000;
    const lying = pieces.flatMap((piece) => {
      const place = geometry.boards.find(({ stockId }) => stockId === piece.stockId);
      if (!place) return [];
      const rect = boundsOf(polygonToStock(piece.stockFromFace, piece.outline));
      const corner = { x: geometry.stockOrigin.x, y: geometry.stockOrigin.y + place.top * px };
      const box: Box = {
        left: corner.x + rect.x * px,
        top: corner.y + rect.y * px,
        width: rect.width * px,
        height: rect.height * px,
      };
      return [{ piece, rect, box }];
    });
    const whole = { left: 0, top: 0, width: this.#canvas.width, height: this.#canvas.height };
    const cleanUps = cleanUpEdges(layout, pieces);
    const bands = lying.flatMap(({ piece, box }) => {
      const cleanUp = cleanUps.get(piece.id);
      return cleanUp ? [lossBand(layout, cleanUp, box, px)] : [];
    });
    this.#sketches.named("loss").put(whole, paintLoss(bands));
    // Chosen pieces lie on top, so that their outline is whole.
    const inOrder = [...lying].sort((p, q) => Number(selection.includes(p.piece.id)) - Number(selection.includes(q.piece.id)));
    for (const { piece, rect, box } of inOrder) {
      const lines = look.showTriangle ? triangleLines(triangle.get(piece.id)?.segments ?? [], rect, px) : [];
      const paint = paintPiece(
        { label: piece.label, chosen: selection.includes(piece.id), trouble: trouble.has(piece.id), triangle: lines },
        palette,
      );
      this.#sketches.named(piece.id).put(box, paint);
    }
    if (look.preview?.kind === "slide") this.#guides(look.preview, geometry, palette);
    this.#sketches.settle();
  }

  /** A line through the whole board where the edge of a piece has snapped to something. */
  #guides({ along, across, stockId }: SlidePreview, geometry: TableGeometry, palette: Palette): void {
    const place = geometry.boards.find((board) => board.stockId === stockId);
    if (!place) return;
    const px = geometry.stockPxPerMm / 1000;
    const { width, height } = this.#canvas;
    this.#sketches.named("guides").put({ left: 0, top: 0, width, height }, (context) => {
      context.beginPath();
      if (along) {
        const x = geometry.stockOrigin.x + along.edge * px;
        context.moveTo(x, 0);
        context.lineTo(x, height);
      }
      if (across) {
        const y = geometry.stockOrigin.y + (place.top + across.edge) * px;
        context.moveTo(0, y);
        context.lineTo(width, y);
      }
      context.strokeStyle = palette.graphite;
      context.lineWidth = 3;
      context.stroke();
      context.strokeStyle = palette.tape;
      context.lineWidth = 1;
      context.stroke();
    });
  }
}

function lossBand({ crosscut, rip }: Preview["layout"], cleanUp: EdgeAmounts, box: Box, px: number): LossBand {
  const { left, right, top, bottom } = cleanUp;
  const [along, across] = [crosscut.kerf, rip.kerf];
  return {
    piece: box,
    grown: {
      left: box.left - (left + along) * px,
      top: box.top - (top + across) * px,
      width: box.width + (left + right + 2 * along) * px,
      height: box.height + (top + bottom + 2 * across) * px,
    },
  };
}

type Segments = NonNullable<ReturnType<ReturnType<typeof factsOf>["triangle"]["get"]>>["segments"];

function triangleLines(segments: Segments, rect: StockRect, px: number): LinePx[] {
  return segments.flatMap(({ inWood }) =>
    inWood === null
      ? []
      : [
          {
            x1: (inWood.from.x - rect.x) * px,
            y1: (inWood.from.y - rect.y) * px,
            x2: (inWood.to.x - rect.x) * px,
            y2: (inWood.to.y - rect.y) * px,
          },
        ],
  );
}
