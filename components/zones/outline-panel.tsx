"use client";
import { Button } from "../ui/button";
import { PanelSection } from "../ui/panel-section";
import { wholeBoard } from "./polygon-edit";
import type { Tool, ZonesState } from "./use-zones";

/** The usable outline: the whole rectangle, or what is left of it inside sap, wane and splits. */
export function OutlinePanel({ zones, onTool }: { zones: ZonesState; onTool: (tool: Tool) => void }) {
  const { doc, selection, size } = zones;
  const editing = selection?.what === "outline";
  return (
    <PanelSection
      title="Usable outline"
      lead={
        doc.outline
          ? `Drawn with ${doc.outline.length} corners. Outside of it nothing is cut.`
          : "The whole board is usable. Draw an outline where its edge is not straight or its ends are split."
      }
    >
      <div className="flex flex-wrap gap-2">
        <Button
          size="small"
          aria-pressed={editing}
          onClick={() => {
            onTool("select");
            if (!doc.outline) zones.change({ ...doc, outline: wholeBoard(size) });
            zones.select(editing ? null : { what: "outline" });
          }}
        >
          {editing ? "Done with corners" : doc.outline ? "Change its corners" : "Start from the whole board"}
        </Button>
        <Button size="small" aria-pressed={zones.tool === "outline"} onClick={() => onTool("outline")}>
          Trace by tapping
        </Button>
        {doc.outline && (
          <Button
            size="small"
            kind="quiet"
            onClick={() => {
              zones.change({ ...doc, outline: null });
              if (editing) zones.select(null);
            }}
          >
            Whole board
          </Button>
        )}
      </div>
    </PanelSection>
  );
}
