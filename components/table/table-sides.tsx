"use client";
/** Show side above, stock side below: the places the canvases are drawn in, and the keys that work on them. */
import { type RefObject, useEffect, useRef, useState } from "react";
import { useUnits } from "@/components/shell/units";
import { mountTableView, type TableView } from "@/lib/editor/canvas/table-view";
import { PieceList } from "./piece-list";
import { ShowHeading, StockHeading } from "./side-headings";
import { useTableActions } from "./table-actions";
import { useTableContext } from "./table-context";
import { pressKey } from "./table-keys";

/** Up and down a page still scrolls by finger on a phone, where the sides fill the screen; a tablet drags in every direction. */
const side = "relative overflow-hidden touch-pan-y md:touch-none";

export function TableSides({ viewRef, onHelp }: { viewRef: RefObject<TableView | null>; onHelp: () => void }) {
  const { editor, viewState } = useTableContext();
  const { style } = useUnits();
  const actions = useTableActions();
  const [showHost, setShowHost] = useState<HTMLDivElement | null>(null);
  const [stockHost, setStockHost] = useState<HTMLDivElement | null>(null);
  const table = useRef<HTMLDivElement>(null);

  useEffect(() => {
    if (!showHost || !stockHost) return;
    const view = mountTableView({ hosts: { show: showHost, stock: stockHost }, editor, viewState, style });
    viewRef.current = view;
    return () => {
      viewRef.current = null;
      void view.dispose();
    };
  }, [showHost, stockHost, editor, viewState, style, viewRef]);

  useEffect(() => {
    const element = table.current;
    const pressed = (event: KeyboardEvent) => {
      const zoomBy = (factor: number) => viewRef.current?.zoomBy(factor);
      const cancelDrag = () => viewRef.current?.cancel() ?? false;
      if (pressKey(event, { actions, editor, zoomBy, cancelDrag, help: onHelp })) event.preventDefault();
    };
    element?.addEventListener("keydown", pressed);
    return () => element?.removeEventListener("keydown", pressed);
  }, [actions, editor, onHelp, viewRef]);

  return (
    <div
      ref={table}
      role="application"
      aria-label="Layout table. Press the question mark for the keys."
      tabIndex={-1}
      className="relative flex min-h-0 min-w-0 flex-col after:pointer-events-none after:absolute after:inset-0 focus-visible:outline-none focus-visible:after:border-2 focus-visible:after:border-chalk"
    >
      <ShowHeading />
      <div ref={setShowHost} className={`${side} h-52 md:h-72 lg:h-auto lg:min-h-40 lg:flex-[5]`} data-side="show" />
      <StockHeading />
      <div
        ref={setStockHost}
        className={`${side} h-60 bg-[#e3e7e6] md:h-80 lg:h-auto lg:min-h-48 lg:flex-[6]`}
        data-side="stock"
      />
      <PieceList />
    </div>
  );
}
