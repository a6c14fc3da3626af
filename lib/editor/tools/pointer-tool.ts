/**
 * What pointers mean on the table, as a state machine without a screen: pressing marks, moving changes only the preview, letting go commits one step, Escape
 * drops it. A press beside all pieces moves the view.
 */
import type { PieceId } from "@/lib/layout";
import type { Pan, TablePoint } from "../view/geometry";
import type { Side } from "../view/zoom";

/** One pointer as the view reports it: pixels on its side, and the point of the table frame (stock side) below it. */
export interface PointerAt {
  readonly pointerId: number;
  readonly side: Side;
  readonly px: Pan;
  readonly point: TablePoint;
  /** Shift: add to the selection when pressing, keep to a straight line when dragging. */
  readonly shift: boolean;
  /** Alt: do not snap. */
  readonly alt: boolean;
}

export type PointerInput =
  /** `part`: a piece that is moved by itself on the show side, such as a divider. */
  | { readonly kind: "press"; readonly pointer: PointerAt; readonly piece: PieceId | null; readonly part: boolean }
  | { readonly kind: "move" | "release"; readonly pointer: PointerAt }
  | { readonly kind: "cancel" };

export type ToolState =
  | { readonly kind: "idle" }
  | { readonly kind: "pressed"; readonly from: PointerAt; readonly piece: PieceId | null; readonly part: boolean }
  /** `part`: moved by itself on the show side; null: what is selected slides on the stock side. */
  | { readonly kind: "dragging"; readonly from: PointerAt; readonly part: PieceId | null }
  | { readonly kind: "panning"; readonly from: PointerAt; readonly last: Pan };

export type ToolEffect =
  | { readonly do: "select"; readonly piece: PieceId; readonly add: boolean }
  | { readonly do: "select-nothing" }
  /** Drag the selected pieces from one point to the other. */
  | {
      readonly do: "preview";
      readonly from: TablePoint;
      readonly at: TablePoint;
      readonly straight: boolean;
      readonly snap: boolean;
    }
  /** Move one part of the face by this much on the show side. */
  | { readonly do: "preview-part"; readonly piece: PieceId; readonly by: Pan }
  | { readonly do: "commit-preview" }
  | { readonly do: "drop-preview" }
  | { readonly do: "pan"; readonly side: Side; readonly by: Pan };

export interface ToolStep {
  readonly state: ToolState;
  readonly effects: readonly ToolEffect[];
}

export const idleTool: ToolState = { kind: "idle" };

/** A hand trembles by a few pixels: below this a press is a tap. */
export const DRAG_STARTS_PX = 4;

export function toolStep(state: ToolState, input: PointerInput, isSelected: (piece: PieceId) => boolean): ToolStep {
  if (input.kind === "cancel") return cancelled(state);
  if (input.kind === "press") return state.kind === "idle" ? pressed(input, isSelected) : only(state);
  // A second finger is no part of this gesture.
  if (state.kind === "idle" || state.from.pointerId !== input.pointer.pointerId) return only(state);
  return input.kind === "move" ? moved(state, input.pointer) : released(state, input.pointer);
}

function pressed(
  { pointer: from, piece, part }: Extract<PointerInput, { kind: "press" }>,
  isSelected: (piece: PieceId) => boolean,
): ToolStep {
  const state: ToolState = { kind: "pressed", from, piece, part };
  if (piece === null || (isSelected(piece) && !from.shift)) return only(state);
  return { state, effects: [{ do: "select", piece, add: from.shift }] };
}

function moved(state: Exclude<ToolState, { kind: "idle" }>, at: PointerAt): ToolStep {
  switch (state.kind) {
    case "pressed": {
      if (Math.hypot(at.px.x - state.from.px.x, at.px.y - state.from.px.y) < DRAG_STARTS_PX) return only(state);
      const { from, piece } = state;
      const part = state.part && from.side === "show" ? piece : null;
      const drags = piece !== null && (from.side === "stock" || part !== null);
      return moved(drags ? { kind: "dragging", from, part } : { kind: "panning", from, last: from.px }, at);
    }
    case "dragging": {
      const { from, part } = state;
      const by = { x: at.px.x - from.px.x, y: at.px.y - from.px.y };
      if (part !== null) return { state, effects: [{ do: "preview-part", piece: part, by }] };
      return {
        state,
        effects: [{ do: "preview", from: state.from.point, at: at.point, straight: at.shift, snap: !at.alt }],
      };
    }
    case "panning": {
      const by = { x: at.px.x - state.last.x, y: at.px.y - state.last.y };
      return { state: { ...state, last: at.px }, effects: [{ do: "pan", side: state.from.side, by }] };
    }
  }
}

function released(state: Exclude<ToolState, { kind: "idle" }>, at: PointerAt): ToolStep {
  switch (state.kind) {
    case "pressed": {
      const effects: ToolEffect[] = [];
      if (state.piece === null) effects.push({ do: "select-nothing" });
      else if (!state.from.shift) effects.push({ do: "select", piece: state.piece, add: false });
      return { state: idleTool, effects };
    }
    case "dragging":
      return { state: idleTool, effects: [...moved(state, at).effects, { do: "commit-preview" }] };
    case "panning":
      return { state: idleTool, effects: moved(state, at).effects };
  }
}

function cancelled(state: ToolState): ToolStep {
  return { state: idleTool, effects: state.kind === "dragging" ? [{ do: "drop-preview" }] : [] };
}

function only(state: ToolState): ToolStep {
  return { state, effects: [] };
}
