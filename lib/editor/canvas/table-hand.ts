/** The hand on the table: turns what pointers do on the two sides into what the editor is told. What a gesture means is decided in `tools/pointer-tool.ts`. */
import { groupById, type PieceId, um } from "@/lib/layout";
import { groupsOfPieces } from "../commands/targets";
import { type Editor, type EditorState, shownLayout } from "../editor";
import type { Store } from "../store";
import { previewAt } from "../tools/drag";
import { movablePart, partPreviewAt } from "../tools/part-drag";
import { idleTool, type PointerAt, type PointerInput, type ToolEffect, type ToolState, toolStep } from "../tools/pointer-tool";
import type { CurrentGeometry } from "../view/current-geometry";
import { type TableGeometry, tablePointAt } from "../view/geometry";
import { pieceOnFaceAt, pieceOnStockAt } from "../view/piece-at";
import type { ViewState } from "../view/view-state";
import { pannedBy, type Side, zoomedAt } from "../view/zoom";
import type { PointerListener, SidePointer } from "./pointer-input";

/** How near to a place a dragged edge is drawn to it, px. */
const SNAP_PX = 7;
const REACH_PX = 2;
/** Fingers are broader than the tip of an arrow. */
const FINGER_REACH_PX = 12;

export interface TableHandOptions {
  readonly hosts: Readonly<Record<Side, HTMLElement>>;
  readonly editor: Editor;
  readonly viewState: Store<ViewState>;
  readonly geometry: CurrentGeometry;
  readonly askFrame: () => void;
}

export class TableHand implements PointerListener {
  readonly #given: TableHandOptions;
  #tool: ToolState = idleTool;
  /** Moves are taken in once a frame: only the last one counts. */
  #lastMove: SidePointer | null = null;

  constructor(given: TableHandOptions) {
    this.#given = given;
  }

  onPress(pressed: SidePointer): void {
    const pointer = this.#toolPointer(pressed);
    if (!pointer) return;
    const piece = this.#pieceUnder(pressed);
    const { document } = this.#given.editor.get();
    this.#play({ kind: "press", pointer, piece, part: piece !== null && movablePart(document.layout, piece) !== null });
  }

  onMove(moved: SidePointer): void {
    if (this.#tool.kind === "idle") {
      this.#showCursor(moved);
      return;
    }
    this.#lastMove = moved;
    this.#given.askFrame();
  }

  onRelease(released: SidePointer): void {
    this.#lastMove = null;
    const pointer = this.#toolPointer(released);
    if (pointer) this.#play({ kind: "release", pointer });
    this.#showCursor(released);
  }

  onCancel(): void {
    this.#lastMove = null;
    this.#play({ kind: "cancel" });
  }

  onZoom(side: Side, factor: number, at: { readonly x: number; readonly y: number }): void {
    const now = this.#given.geometry.now();
    const { sides, view } = this.#given.viewState.get();
    if (!now || !sides) return;
    this.#given.geometry.look(zoomedAt(view, factor, side, at, { show: now.showOrigin, stock: now.stockOrigin }, sides));
  }

  onPan(side: Side, by: { readonly x: number; readonly y: number }): void {
    this.#given.geometry.look(pannedBy(this.#given.viewState.get().view, side, by));
  }

  /** Takes in where the pointer is now, at the start of a frame. */
  takeLastMove(): void {
    const move = this.#lastMove;
    this.#lastMove = null;
    const pointer = move && this.#toolPointer(move);
    if (pointer) this.#play({ kind: "move", pointer });
  }

  /** Drops a drag in progress; false when there was none. */
  cancel(): boolean {
    const dragging = this.#tool.kind === "dragging";
    this.onCancel();
    return dragging;
  }

  #play(input: PointerInput): void {
    const { selection } = this.#given.editor.get();
    const step = toolStep(this.#tool, input, (piece) => selection.includes(piece));
    this.#tool = step.state;
    for (const effect of step.effects) this.#act(effect);
  }

  #act(effect: ToolEffect): void {
    const { editor } = this.#given;
    if (effect.do === "select" && effect.add) editor.toggle(effect.piece);
    else if (effect.do === "select") editor.select([effect.piece]);
    else if (effect.do === "select-nothing") editor.select([]);
    else if (effect.do === "preview") this.#showPreview(effect);
    else if (effect.do === "preview-part") this.#showPart(effect);
    else if (effect.do === "commit-preview") editor.commitPreview();
    else if (effect.do === "drop-preview") editor.dropPreview();
    else this.onPan(effect.side, effect.by);
  }

  #showPreview({ from, at, straight, snap }: Extract<ToolEffect, { do: "preview" }>): void {
    const { editor, geometry, hosts } = this.#given;
    const now = geometry.now();
    if (!now || !editor.mayChange) return;
    hosts.stock.style.cursor = "grabbing";
    const { document, boardFaces } = editor.get();
    const table = { boards: boardFaces, places: now.boards };
    const drag = { groupIds: groupsThatLie(editor.get()), start: from };
    const snapWithin = snap ? um(Math.round((SNAP_PX / now.stockPxPerMm) * 1000)) : null;
    editor.showPreview(previewAt(document.layout, table, drag, at, { snapWithin, straight }));
  }

  #showPart({ piece, by }: Extract<ToolEffect, { do: "preview-part" }>): void {
    const { editor, geometry, hosts } = this.#given;
    const now = geometry.now();
    if (!now || !editor.mayChange) return;
    const umPerPx = 1000 / now.showPxPerMm;
    hosts.show.style.cursor = "grabbing";
    editor.showPreview(partPreviewAt(editor.get().document.layout, piece, { x: by.x * umPerPx, y: by.y * umPerPx }));
  }

  #toolPointer(pointer: SidePointer): PointerAt | null {
    const now = this.#given.geometry.now();
    return now && { ...pointer, point: tablePointAt(now, pointer.px) };
  }

  #pieceUnder(pointer: SidePointer): PieceId | null {
    const now = this.#given.geometry.now();
    return now && pieceUnder(shownLayout(this.#given.editor.get()), now, pointer);
  }

  #showCursor(pointer: SidePointer): void {
    this.#given.hosts[pointer.side].style.cursor = this.#cursorOver(this.#pieceUnder(pointer), pointer.side);
  }

  #cursorOver(piece: PieceId | null, side: Side): string {
    if (piece === null) return "default";
    if (side === "stock") return "grab";
    const part = movablePart(this.#given.editor.get().document.layout, piece);
    if (part === null) return "pointer";
    return part.axis === "x" ? "ew-resize" : "ns-resize";
  }
}

function pieceUnder(
  layout: EditorState["document"]["layout"],
  now: TableGeometry,
  { side, px, coarse }: SidePointer,
): PieceId | null {
  const reachPx = coarse ? FINGER_REACH_PX : REACH_PX;
  if (side === "stock") {
    return pieceOnStockAt(layout, now.boards, tablePointAt(now, px), (reachPx * 1000) / now.stockPxPerMm);
  }
  const umPerPx = 1000 / now.showPxPerMm;
  const point = { x: (px.x - now.showOrigin.x) * umPerPx, y: (px.y - now.showOrigin.y) * umPerPx };
  return pieceOnFaceAt(layout, point, reachPx * umPerPx);
}

/** The groups of the selected pieces that lie on wood. */
function groupsThatLie({ document, selection }: EditorState): string[] {
  return groupsOfPieces(document.layout, selection).filter((id) => groupById(document.layout, id)?.placement != null);
}
