"use client";
/** What can be done with the fronts in hand. */
import { Maximize, Minus, Plus, Redo2, Undo2 } from "lucide-react";
import { type ReactNode, type RefObject, useState } from "react";
import type { TableView } from "@/lib/editor/canvas/table-view";
import { ZOOM_STEP } from "@/lib/editor/view/zoom";
import { groupOf, SET_ID } from "@/lib/layout";
import { BetterPlacesDialog } from "./better-places-dialog";
import { FindWoodDialog } from "./find-wood-dialog";
import { useTableActions } from "./table-actions";
import { useEditorState, useTableContext, useViewState } from "./table-context";

export function ToolBar({ viewRef, onHelp }: { viewRef: RefObject<TableView | null>; onHelp: () => void }) {
  const { editor } = useTableContext();
  const actions = useTableActions();
  const canUndo = useEditorState((state) => state.history.past.length > 0);
  const canRedo = useEditorState((state) => state.history.future.length > 0);
  const selection = useEditorState((state) => state.selection);
  const layout = useEditorState((state) => state.document.layout);
  const triangle = useViewState((state) => state.showTriangle);
  const grain = useViewState((state) => state.showGrain);
  const [searching, setSearching] = useState<"board" | "rack" | null>(null);
  const someLoose = selection.some((id) => groupOf(layout, id)?.id !== SET_ID);
  return (
    <div
      role="toolbar"
      aria-label="Layout"
      className="flex flex-wrap items-center gap-1 border-b border-rule bg-sheet px-3 py-1.5 md:px-4"
    >
      {editor.mayChange && (
        <>
          <Tool onClick={actions.undo} disabled={!canUndo} name="Undo">
            <Undo2 className="size-4" aria-hidden="true" />
          </Tool>
          <Tool onClick={actions.redo} disabled={!canRedo} name="Redo">
            <Redo2 className="size-4" aria-hidden="true" />
          </Tool>
          <Rule />
          <Tool onClick={actions.turn}>Turn end for end</Tool>
          <Tool onClick={actions.swap} disabled={selection.length !== 2}>
            Swap
          </Tool>
          <Tool onClick={actions.letLoose} disabled={selection.length === 0}>
            Let loose
          </Tool>
          <Tool onClick={actions.takeBack} disabled={!someLoose}>
            Back into the set
          </Tool>
          <Tool onClick={actions.lift}>Take off the board</Tool>
          <Tool onClick={actions.turnGrain}>Turn the grain</Tool>
          <Rule />
          <Tool onClick={() => setSearching("board")}>Better places…</Tool>
          <Tool onClick={() => setSearching("rack")}>Find wood…</Tool>
          <Rule />
        </>
      )}
      <Tool onClick={actions.toggleTriangle} pressed={triangle}>
        Triangle
      </Tool>
      <Tool onClick={actions.toggleGrain} pressed={grain}>
        Grain
      </Tool>
      <span className="ml-auto flex items-center gap-1">
        <Tool onClick={() => viewRef.current?.zoomBy(1 / ZOOM_STEP)} name="Further away">
          <Minus className="size-4" aria-hidden="true" />
        </Tool>
        <Tool onClick={actions.seeAll} name="See everything">
          <Maximize className="size-4" aria-hidden="true" />
        </Tool>
        <Tool onClick={() => viewRef.current?.zoomBy(ZOOM_STEP)} name="Nearer">
          <Plus className="size-4" aria-hidden="true" />
        </Tool>
        <Tool onClick={onHelp} name="Keys and help">
          ?
        </Tool>
      </span>
      <BetterPlacesDialog open={searching === "board"} onOpenChange={(open) => setSearching(open ? "board" : null)} />
      <FindWoodDialog open={searching === "rack"} onOpenChange={(open) => setSearching(open ? "rack" : null)} />
    </div>
  );
}

interface ToolProps {
  onClick: () => void;
  children: ReactNode;
  disabled?: boolean;
  /** For a button that shows only a sign. */
  name?: string;
  pressed?: boolean;
}

function Tool({ onClick, children, disabled, name, pressed }: ToolProps) {
  const look = pressed ? "bg-chalk-wash text-chalk" : "hover:bg-chalk-wash";
  return (
    <button
      type="button"
      onClick={onClick}
      disabled={disabled}
      aria-label={name}
      title={name}
      aria-pressed={pressed}
      className={`inline-flex min-h-11 min-w-11 items-center justify-center rounded-md px-2.5 text-sm font-semibold whitespace-nowrap disabled:text-pencil disabled:opacity-50 lg:min-h-9 lg:min-w-9 ${look}`}
    >
      {children}
    </button>
  );
}

function Rule() {
  return <span className="mx-1 h-6 w-px bg-rule" aria-hidden="true" />;
}
