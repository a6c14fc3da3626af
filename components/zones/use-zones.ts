"use client";
/** The drawing on the screen: document with undo, what is selected, which tool is in hand, what has been saved. */
import { useEffect, useState } from "react";
import { v7 as newId } from "uuid";
import { type StockPoint, um } from "@/lib/layout";
import { type GlueLine, type KeepClearArea, mostGlueLines, type Zones } from "@/lib/schemas/zones";
import { areaAt } from "./area-at";
import { ellipseInBox } from "./ellipse-edit";
import { commit, redo, startHistory, undo } from "./history";
import { FEWEST_CORNERS, MOST_CORNERS, snapped } from "./polygon-edit";
import { docOf, type PictureSize, withArea, withGlueLine, withoutArea, type ZonesDoc } from "./zones-doc";

/** "outline" and "polygon" put down corners, tap by tap; "ellipse" is drawn by dragging a box; "glue-line" is one tap. */
export type Tool = "select" | "outline" | "ellipse" | "polygon" | "glue-line";
export type Selection =
  | { readonly what: "outline" }
  | { readonly what: "area"; readonly id: string }
  | { readonly what: "glue-line"; readonly id: string }
  | null;

/** µm. */
interface Place {
  readonly x: number;
  readonly y: number;
}

export interface ZonesState {
  readonly size: PictureSize;
  /** With the drag in progress. */
  readonly doc: ZonesDoc;
  readonly tool: Tool;
  /** Corners put down so far by a tapping tool. */
  readonly traced: readonly StockPoint[];
  readonly selection: Selection;
  readonly selectedArea: KeepClearArea | null;
  /** The corner last taken hold of, of the selected outline or polygon. */
  readonly corner: number | null;
  readonly revision: number;
  readonly dirty: boolean;
  readonly canUndo: boolean;
  readonly canRedo: boolean;
  take: (tool: Tool) => void;
  select: (selection: Selection) => void;
  selectCorner: (corner: number | null) => void;
  /** Shows a change that is not made yet; null drops it. */
  preview: (doc: ZonesDoc | null) => void;
  /** Makes a change; presses in a row with the same key are undone as one. */
  change: (doc: ZonesDoc, key?: string) => void;
  /** A tap with the tool in hand; `reach`: what counts as on the spot. */
  tap: (at: Place, reach: number) => void;
  drawBox: (from: Place, to: Place, done: boolean) => void;
  closeTrace: () => void;
  dropLastCorner: () => void;
  removeSelected: () => void;
  undo: () => void;
  redo: () => void;
  /** What the server holds now. */
  saved: (doc: ZonesDoc, revision: number) => void;
  /** Lays another document over this one, as a change that can be undone, and takes it as saved. */
  takeTheirs: (theirs: Zones) => void;
}

export function useZones(start: Zones, size: PictureSize): ZonesState {
  const [history, setHistory] = useState(() => startHistory(docOf(start)));
  const [kept, setKept] = useState({ doc: history.now, revision: start.revision });
  const [shown, setShown] = useState<ZonesDoc | null>(null);
  const [tool, setTool] = useState<Tool>("select");
  const [traced, setTraced] = useState<readonly StockPoint[]>([]);
  const [selection, setSelection] = useState<Selection>(null);
  const [corner, selectCorner] = useState<number | null>(null);
  const doc = shown ?? history.now;
  const selectedArea = (selection?.what === "area" && doc.keepClear.find(({ id }) => id === selection.id)) || null;

  const change = (next: ZonesDoc, key?: string) => {
    setShown(null);
    setHistory((from) => commit(from, next, key ?? null));
  };
  const select = (next: Selection) => {
    setSelection(next);
    selectCorner(null);
  };
  const take = (next: Tool) => {
    selectCorner(null);
    setTool(next);
    setTraced([]);
    setShown(null);
  };
  const add = (area: KeepClearArea["area"]) => {
    const made: KeepClearArea = { id: newId(), kind: "knot", area, note: "" };
    change(withArea(history.now, made));
    select({ what: "area", id: made.id });
    take("select");
  };
  const addGlueLine = ({ y }: Place) => {
    if (history.now.glueLines.length >= mostGlueLines) return;
    const across = um(Math.round(Math.min(Math.max(y, 1), size.width - 1)));
    const made: GlueLine = { id: newId(), across, aboveBoardId: null, belowBoardId: null };
    change(withGlueLine(history.now, made));
    select({ what: "glue-line", id: made.id });
    take("select");
  };
  const closeTrace = () => {
    if (traced.length < FEWEST_CORNERS) return;
    if (tool === "polygon") return add({ shape: "polygon", points: [...traced] });
    change({ ...history.now, outline: traced });
    select({ what: "outline" });
    take("select");
  };
  const tap = (at: Place, reach: number) => {
    if (tool === "select") {
      const area = areaAt(history.now.keepClear, at, reach);
      select(area ? { what: "area", id: area.id } : null);
    } else if (tool === "glue-line") {
      addGlueLine(at);
    } else if (tool === "ellipse") {
      // A tap, or Enter, cannot draw a box: it puts down an ellipse of the size of a middling knot, to be sized by its handles.
      add({ shape: "ellipse", centre: snapped(at, size, 0, false), radiusX: um(20_000), radiusY: um(12_000), turnDeg: 0 });
    } else {
      const [first] = traced;
      if (first && traced.length >= FEWEST_CORNERS && Math.hypot(first.x - at.x, first.y - at.y) <= reach) return closeTrace();
      if (traced.length < MOST_CORNERS) setTraced([...traced, snapped(at, size, reach, tool === "outline")]);
    }
  };
  return {
    size,
    doc,
    tool,
    traced,
    selection,
    selectedArea,
    revision: kept.revision,
    dirty: history.now !== kept.doc,
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
    take,
    corner,
    select,
    selectCorner,
    preview: setShown,
    change,
    tap,
    drawBox: (from, to, done) => {
      const area = ellipseInBox(from, to);
      if (!area) return setShown(null);
      if (done) return add(area);
      setShown(withArea(history.now, { id: "drawn", kind: "knot", area, note: "" }));
    },
    closeTrace,
    dropLastCorner: () => setTraced(traced.slice(0, -1)),
    removeSelected: () => {
      if (!selectedArea) return;
      change(withoutArea(history.now, selectedArea.id));
      select(null);
    },
    undo: () => setHistory(undo),
    redo: () => setHistory(redo),
    saved: (saved, revision) => setKept({ doc: saved, revision }),
    takeTheirs: (theirs) => {
      const taken = docOf(theirs);
      change(taken);
      setKept({ doc: taken, revision: theirs.revision });
      select(null);
    },
  };
}

/** Ctrl or ⌘ with Z and Y, unless something is being typed. */
export function useUndoKeys(zones: Pick<ZonesState, "undo" | "redo">): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
      if (event.target instanceof HTMLInputElement || event.target instanceof HTMLTextAreaElement) return;
      const key = event.key.toLowerCase();
      if (key === "z" && !event.shiftKey) zones.undo();
      else if (key === "y" || key === "z") zones.redo();
      else return;
      event.preventDefault();
    };
    window.addEventListener("keydown", onKey);
    return () => window.removeEventListener("keydown", onKey);
  });
}
