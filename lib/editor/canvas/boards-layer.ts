/** The lowest layer of the stock side: boards as photographed, their tapes, names, outlines, keep-clear areas and what other faces take. Still while pieces are dragged. */
import type { StaticCanvas } from "fabric";
import { type LengthStyle, printLength } from "@/lib/layout";
import { tapeMarks } from "@/lib/words/tape-marks";
import type { TableBoard } from "../table-board";
import { BOARD_SPACE_PX, TAPE_PX, type TableGeometry } from "../view/geometry";
import type { ViewState } from "../view/view-state";
import { paintGlueLines } from "./marks/glue-lines";
import { paintGrain } from "./marks/grain";
import { paintSpokenFor } from "./marks/spoken-for";
import { paintTape } from "./marks/tape-strip";
import { paintBoard } from "./marks/wood";
import { paintZones } from "./marks/zones";
import type { Palette } from "./palette";
import type { Pictures } from "./pictures";
import { Sketches } from "./sketches";

export interface BoardsLook {
  readonly style: LengthStyle;
  readonly palette: Palette;
  /** By version of a board's picture; drawn over every board that has one. */
  readonly grains: ViewState["grains"];
}

export class BoardsLayer {
  readonly #sketches: Sketches;
  readonly #canvas: StaticCanvas;

  constructor(canvas: StaticCanvas) {
    this.#canvas = canvas;
    this.#sketches = new Sketches(canvas);
  }

  sync(boards: readonly TableBoard[], geometry: TableGeometry, pictures: Pictures, look: BoardsLook): void {
    const { palette, style } = look;
    const scale = geometry.stockPxPerMm;
    const { x: originX, y: originY } = geometry.stockOrigin;
    const visible = { from: -originX, to: this.#canvas.width - originX };
    boards.forEach((board, index) => {
      const place = geometry.boards[index];
      if (!place) return;
      const { id, length, width } = board.face;
      const top = originY + (place.top / 1000) * scale;
      const box = { left: originX, top, width: (length / 1000) * scale, height: (width / 1000) * scale };
      const picture = pictures.at(board, scale * window.devicePixelRatio);
      this.#sketches.named(`${id} wood`).put(box, paintBoard(picture, visible, palette));
      const grain = look.grains.get(board.straighteningId);
      if (grain) this.#sketches.named(`${id} grain`).put(box, paintGrain(grain, scale, palette));
      if (board.face.glueLines.length > 0) {
        this.#sketches.named(`${id} glue lines`).put(box, paintGlueLines(board.face.glueLines, scale, palette));
      }
      this.#sketches.named(`${id} zones`).put(box, paintZones(board.face, scale, palette));
      this.#sketches.named(`${id} spoken for`).put(box, paintSpokenFor(board.spokenFor, scale, palette));
      const marks = tapeMarks(length, scale, style.unit);
      const tape = { left: originX, top: top - TAPE_PX, width: box.width, height: TAPE_PX };
      this.#sketches.named(`${id} tape`).put(tape, paintTape(marks, scale, style.unit === "mm" ? "mm" : "in", palette));
      this.#name(board, top - TAPE_PX - BOARD_SPACE_PX, Math.max(originX, 12), look);
    });
    this.#sketches.settle();
  }

  #name({ face, tag, side, species, place }: TableBoard, top: number, left: number, { palette, style }: BoardsLook): void {
    const size = `${printLength(face.length, style)} × ${printLength(face.width, style)} × ${printLength(face.thickness, style)}`;
    const roomy = this.#canvas.width > 560;
    const rest = (roomy ? [species, size, place] : [species]).filter((part) => part !== "").join(", ");
    const box = { left, top, width: this.#canvas.width, height: BOARD_SPACE_PX };
    this.#sketches.named(`${face.id} name`).put(box, (context) => {
      context.textBaseline = "alphabetic";
      context.fillStyle = palette.graphite;
      context.font = `700 16px ${palette.measure}`;
      const bold = `Board ${tag}${side === "back" ? ", back up" : ""}`;
      context.fillText(bold, 0, 22);
      const after = context.measureText(bold).width + 8;
      context.font = `500 15px ${palette.measure}`;
      context.fillStyle = palette.pencil;
      context.fillText(rest, after, 22);
    });
  }
}
