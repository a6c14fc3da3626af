/** Paints the two sides of the table from the editor's state, on three canvases: what stands still while pieces are dragged is not painted again. */
import { StaticCanvas } from "fabric";
import type { LengthStyle } from "@/lib/layout";
import { type EditorState, shownLayout } from "../editor";
import { piecesOfProblem, problemsOf } from "../selectors/facts";
import type { Size, TableGeometry } from "../view/geometry";
import type { ViewState } from "../view/view-state";
import type { Side } from "../view/zoom";
import { BoardsLayer } from "./boards-layer";
import { readPalette } from "./palette";
import { Pictures } from "./pictures";
import { PiecesLayer } from "./pieces-layer";
import { ShowLayer } from "./show-layer";

const noGrains: ViewState["grains"] = new Map();

export class TablePainter {
  readonly #style: LengthStyle;
  readonly #palette = readPalette();
  readonly #canvases: Readonly<Record<"show" | "boards" | "pieces", StaticCanvas>>;
  readonly #show: ShowLayer;
  readonly #boards: BoardsLayer;
  readonly #pieces: PiecesLayer;
  readonly #pictures: Pictures;
  /** What the boards were last painted from; null when a picture has come in since. */
  #boardsPainted: {
    readonly geometry: TableGeometry;
    readonly boards: EditorState["boards"];
    readonly grains: ViewState["grains"];
  } | null = null;

  /** `onPicture`: a picture has come in, and painting again would show more. */
  constructor(hosts: Readonly<Record<Side, HTMLElement>>, style: LengthStyle, onPicture: () => void) {
    this.#style = style;
    this.#canvases = { show: canvasIn(hosts.show), boards: canvasIn(hosts.stock), pieces: canvasIn(hosts.stock) };
    this.#show = new ShowLayer(this.#canvases.show);
    this.#boards = new BoardsLayer(this.#canvases.boards);
    this.#pieces = new PiecesLayer(this.#canvases.pieces);
    this.#pictures = new Pictures(() => {
      this.#boardsPainted = null;
      onPicture();
    });
  }

  resize({ show, stock }: Readonly<Record<Side, Size>>): void {
    this.#canvases.show.setDimensions(show);
    this.#canvases.boards.setDimensions(stock);
    this.#canvases.pieces.setDimensions(stock);
    this.#boardsPainted = null;
  }

  paint(state: EditorState, { showTriangle, showGrain, grains: read }: ViewState, geometry: TableGeometry): void {
    const { boards, boardFaces, selection, preview } = state;
    const layout = shownLayout(state);
    const [style, palette] = [this.#style, this.#palette];
    const grains = showGrain ? read : noGrains;
    const painted = this.#boardsPainted;
    if (painted?.geometry !== geometry || painted.boards !== boards || painted.grains !== grains) {
      this.#boardsPainted = { geometry, boards, grains };
      this.#boards.sync(boards, geometry, this.#pictures, { style, palette, grains });
      this.#canvases.boards.renderAll();
    }
    const trouble = new Set(problemsOf(layout, boardFaces).flatMap(piecesOfProblem));
    this.#pieces.sync({ layout, selection, trouble, showTriangle, preview }, geometry, palette);
    this.#canvases.pieces.renderAll();
    const look = { layout, boards, selection, showTriangle, dragging: preview !== null, style };
    this.#show.sync(look, geometry, this.#pictures, palette);
    this.#canvases.show.renderAll();
  }

  /** Frees pictures and canvases; fabric takes a moment for that. */
  async dispose(): Promise<void> {
    this.#pictures.dispose();
    await Promise.all(Object.values(this.#canvases).map(removed));
  }
}

function canvasIn(host: HTMLElement): StaticCanvas {
  const element = document.createElement("canvas");
  element.setAttribute("aria-hidden", "true");
  host.append(element);
  const canvas = new StaticCanvas(element, { renderOnAddRemove: false, enableRetinaScaling: true });
  canvas.lowerCanvasEl.style.position = "absolute";
  canvas.lowerCanvasEl.style.inset = "0";
  return canvas;
}

async function removed(canvas: StaticCanvas): Promise<void> {
  const element = canvas.lowerCanvasEl;
  await canvas.dispose();
  element.remove();
}
