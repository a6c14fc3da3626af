/** How the table is looked at: not part of the document, not undone, not saved. */
import type { GrainOnWire } from "@/lib/schemas/figure";
import { createStore, type Store } from "../store";
import { type Size, type View, wholeView } from "./geometry";

export interface ViewState {
  readonly view: View;
  readonly showTriangle: boolean;
  readonly showGrain: boolean;
  /** Grain as read, by version of a board's picture; only what has been asked for and has come. */
  readonly grains: ReadonlyMap<string, GrainOnWire>;
  /** In CSS pixels; null until the sides are on the screen. */
  readonly sides: { readonly show: Size; readonly stock: Size } | null;
}

export function createViewState(): Store<ViewState> {
  return createStore<ViewState>({ view: wholeView, showTriangle: true, showGrain: false, grains: new Map(), sides: null });
}
