/**
 * The layout table on the screen: two sides in two places of the page, drawn from the editor's state once a frame at most, and pointers on them turned into what
 * the editor is told. Holds no state that matters: everything is drawn again from the document.
 */
import { StaticCanvas } from "fabric";
import { groupById, type LengthStyle, type PieceId, um } from "@/lib/layout";
import { groupsOfPieces } from "../commands/targets";
import { type Editor, type EditorState, shownLayout } from "../editor";
import { piecesOfProblem, problemsOf } from "../selectors/facts";
import type { Store } from "../store";
import { previewAt } from "../tools/drag";
import { idleTool, type PointerAt, type PointerInput, type ToolEffect, type ToolState, toolStep } from "../tools/pointer-tool";
import { type Size, type TableGeometry, tableGeometry, tablePointAt, type View } from "../view/geometry";
import { pieceOnFaceAt, pieceOnStockAt } from "../view/piece-at";
import type { ViewState } from "../view/view-state";
import { pannedBy, type Side, zoomedAt } from "../view/zoom";
import { BoardsLayer } from "./boards-layer";
import { createFrameClock } from "./frame-clock";
import { readPalette } from "./palette";
import { Pictures } from "./pictures";
import { PiecesLayer } from "./pieces-layer";
import { listenToPointers, type PointerListener, type SidePointer } from "./pointer-input";
import { ShowLayer } from "./show-layer";

export interface TableViewOptions {
  readonly hosts: Readonly<Record<Side, HTMLElement>>;
  readonly editor: Editor;
  readonly viewState: Store<ViewState>;
  readonly style: LengthStyle;
}

export interface TableView {
  /** Drops a drag in progress; false when there was none. */
  readonly cancel: () => boolean;
  readonly zoomBy: (factor: number) => void;
  /** Frees everything. The places in the page are empty when the promise resolves. */
  readonly dispose: () => Promise<void>;
}

/** How near to a place a dragged edge is drawn to it, px. */
const SNAP_PX = 7;
const REACH_PX = 2;
const FINGER_REACH_PX = 12;

export function mountTableView({ hosts, editor, viewState, style }: TableViewOptions): TableView {
  const palette = readPalette();
  const canvases = {
    show: canvasIn(hosts.show),
    boards: canvasIn(hosts.stock),
    pieces: canvasIn(hosts.stock),
  };
  const layers = {
    show: new ShowLayer(canvases.show),
    boards: new BoardsLayer(canvases.boards),
    pieces: new PiecesLayer(canvases.pieces),
  };
  let tool: ToolState = idleTool;
  /** Moves are taken in once a frame: only the last one counts. */
  let lastMove: SidePointer | null = null;
  let drawn: Drawn | null = null;
  let picturesChanged = false;

  const clock = createFrameClock(
    () => takeLastMove(),
    () => draw(),
  );
  const pictures = new Pictures(() => {
    picturesChanged = true;
    clock.ask();
  });

  const geometryNow = (): TableGeometry | null => {
    const { sides, view } = viewState.get();
    const state = editor.get();
    if (!sides) return null;
    const key = [sides, view, state.boardFaces, state.document.layout.face] as const;
    if (drawn && key.every((part, index) => part === drawn?.geometryKey[index])) return drawn.geometry;
    return tableGeometry({ boards: state.boardFaces, face: state.document.layout.face }, sides, view);
  };

  const look = (view: View) => {
    const state = viewState.get();
    const { document, boardFaces } = editor.get();
    if (!state.sides) return;
    const held = tableGeometry({ boards: boardFaces, face: document.layout.face }, state.sides, view).view;
    viewState.set({ ...state, view: held });
  };

  const draw = () => {
    const geometry = geometryNow();
    const { sides, view, showTriangle } = viewState.get();
    if (!geometry || !sides) return;
    const state = editor.get();
    const layout = shownLayout(state);
    const { boards, boardFaces, selection, preview } = state;
    const still = drawn?.geometry === geometry && drawn.boards === boards && !picturesChanged;
    picturesChanged = false;
    drawn = { geometry, geometryKey: [sides, view, boardFaces, state.document.layout.face], boards };

    if (!still) {
      layers.boards.sync(boards, geometry, pictures, { style, palette });
      canvases.boards.renderAll();
    }
    const trouble = new Set(problemsOf(layout, boardFaces).flatMap(piecesOfProblem));
    layers.pieces.sync({ layout, selection, trouble, showTriangle, preview }, geometry, palette);
    canvases.pieces.renderAll();
    layers.show.sync({ layout, boards, selection, showTriangle, dragging: preview !== null, style }, geometry, pictures, palette);
    canvases.show.renderAll();
  };

  const play = (input: PointerInput) => {
    const { selection } = editor.get();
    const step = toolStep(tool, input, (piece) => selection.includes(piece));
    tool = step.state;
    for (const effect of step.effects) act(effect);
    showHand();
  };

  const act = (effect: ToolEffect) => {
    switch (effect.do) {
      case "select":
        return effect.add ? editor.toggle(effect.piece) : editor.select([effect.piece]);
      case "select-nothing":
        return editor.select([]);
      case "preview":
        return showPreview(effect);
      case "commit-preview":
        return editor.commitPreview();
      case "drop-preview":
        return editor.dropPreview();
      case "pan":
        return look(pannedBy(viewState.get().view, effect.side, effect.by));
    }
  };

  const showPreview = ({ from, at, straight, snap }: Extract<ToolEffect, { do: "preview" }>) => {
    const geometry = geometryNow();
    if (!geometry || !editor.mayChange) return;
    const { document, boardFaces } = editor.get();
    const groupIds = draggedGroups(editor.get());
    const snapWithin = snap ? um(Math.round((SNAP_PX / geometry.stockPxPerMm) * 1000)) : null;
    const table = { boards: boardFaces, places: geometry.boards };
    editor.showPreview(previewAt(document.layout, table, { groupIds, start: from }, at, { snapWithin, straight }));
  };

  const toolPointer = (pointer: SidePointer): PointerAt | null => {
    const geometry = geometryNow();
    return geometry && { ...pointer, point: tablePointAt(geometry, pointer.px) };
  };

  const pieceUnder = ({ side, px, coarse }: SidePointer): PieceId | null => {
    const geometry = geometryNow();
    if (!geometry) return null;
    const layout = shownLayout(editor.get());
    const reachPx = coarse ? FINGER_REACH_PX : REACH_PX;
    if (side === "stock") {
      const umPerPx = 1000 / geometry.stockPxPerMm;
      return pieceOnStockAt(layout, geometry.boards, tablePointAt(geometry, px), reachPx * umPerPx);
    }
    const umPerPx = 1000 / geometry.showPxPerMm;
    const point = { x: (px.x - geometry.showOrigin.x) * umPerPx, y: (px.y - geometry.showOrigin.y) * umPerPx };
    return pieceOnFaceAt(layout, point, reachPx * umPerPx);
  };

  const takeLastMove = () => {
    const move = lastMove;
    lastMove = null;
    const pointer = move && toolPointer(move);
    if (pointer) play({ kind: "move", pointer });
  };

  const showHand = () => {
    hosts.stock.style.cursor = tool.kind === "dragging" ? "grabbing" : "default";
  };

  const listener: PointerListener = {
    onPress(pressed) {
      const pointer = toolPointer(pressed);
      if (pointer) play({ kind: "press", pointer, piece: pieceUnder(pressed) });
    },
    onMove(moved) {
      if (tool.kind === "idle") {
        hosts[moved.side].style.cursor = pieceUnder(moved) === null ? "default" : moved.side === "stock" ? "grab" : "pointer";
        return;
      }
      lastMove = moved;
      clock.ask();
    },
    onRelease(released) {
      lastMove = null;
      const pointer = toolPointer(released);
      if (pointer) play({ kind: "release", pointer });
    },
    onCancel() {
      lastMove = null;
      play({ kind: "cancel" });
    },
    onZoom(side, factor, at) {
      const geometry = geometryNow();
      const state = viewState.get();
      if (!geometry || !state.sides) return;
      const origins = { show: geometry.showOrigin, stock: geometry.stockOrigin };
      look(zoomedAt(state.view, factor, side, at, origins, state.sides));
    },
    onPan: (side, by) => act({ do: "pan", side, by }),
  };

  const measure = () => {
    const sides = { show: sizeOf(hosts.show), stock: sizeOf(hosts.stock) };
    const before = viewState.get().sides;
    if (before && sameSize(before.show, sides.show) && sameSize(before.stock, sides.stock)) return;
    canvases.show.setDimensions(sides.show);
    canvases.boards.setDimensions(sides.stock);
    canvases.pieces.setDimensions(sides.stock);
    viewState.set({ ...viewState.get(), sides });
  };
  const resizes = new ResizeObserver(measure);
  resizes.observe(hosts.show);
  resizes.observe(hosts.stock);
  // A view left by an earlier mount still has its sides; the new canvases need them all the same.
  viewState.set({ ...viewState.get(), sides: null });
  measure();

  const stops = [
    editor.subscribe(clock.ask),
    viewState.subscribe(clock.ask),
    listenToPointers(hosts.show, "show", listener),
    listenToPointers(hosts.stock, "stock", listener),
  ];
  // Labels are painted in letters that may still be on their way.
  document.fonts.ready.then(clock.ask);
  clock.ask();

  return {
    cancel() {
      const dragging = tool.kind === "dragging";
      listener.onCancel();
      return dragging;
    },
    zoomBy(factor) {
      const { sides } = viewState.get();
      if (sides) listener.onZoom("stock", factor, { x: sides.stock.width / 2, y: sides.stock.height / 2 });
    },
    async dispose() {
      for (const stop of stops) stop();
      resizes.disconnect();
      clock.stop();
      pictures.dispose();
      await Promise.all(Object.values(canvases).map((canvas) => removed(canvas)));
    },
  };
}

interface Drawn {
  readonly geometry: TableGeometry;
  readonly geometryKey: readonly unknown[];
  readonly boards: EditorState["boards"];
}

/** The groups of the selected pieces that lie on wood. */
function draggedGroups({ document, selection }: EditorState): string[] {
  return groupsOfPieces(document.layout, selection).filter((id) => groupById(document.layout, id)?.placement != null);
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

function sizeOf(host: HTMLElement): Size {
  return { width: Math.max(1, host.clientWidth), height: Math.max(1, host.clientHeight) };
}

function sameSize(a: Size, b: Size): boolean {
  return a.width === b.width && a.height === b.height;
}
