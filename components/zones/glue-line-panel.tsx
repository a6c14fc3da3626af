"use client";
import { Trash2 } from "lucide-react";
import type { Board } from "@/lib/schemas/board";
import type { GlueLine } from "@/lib/schemas/zones";
import { Button } from "../ui/button";
import { LengthField } from "../ui/length-field";
import { PanelSection } from "../ui/panel-section";
import type { Tool, ZonesState } from "./use-zones";
import { withGlueLine, withoutGlueLine } from "./zones-doc";

interface Props {
  board: Board;
  zones: ZonesState;
  onTool: (tool: Tool) => void;
}

/** Where boards are glued edge to edge. A board with lines is a blank. */
export function GlueLinePanel({ board, zones, onTool }: Props) {
  const { doc } = zones;
  return (
    <PanelSection
      title="Glue lines"
      lead={
        doc.glueLines.length === 0
          ? "For a blank that is glued up from several boards: say where they meet. Nothing to do for a board in one piece."
          : "This is a blank: boards glued edge to edge. The lines are drawn wherever its wood is laid out."
      }
    >
      <Button
        size="small"
        className="self-start"
        aria-pressed={zones.tool === "glue-line"}
        onClick={() => onTool(zones.tool === "glue-line" ? "select" : "glue-line")}
      >
        Add a glue line
      </Button>
      {doc.glueLines.length > 0 && (
        <ol className="flex flex-col gap-2">
          {doc.glueLines.map((line, index) => (
            <li key={line.id}>
              <Line board={board} line={line} index={index} zones={zones} />
            </li>
          ))}
        </ol>
      )}
    </PanelSection>
  );
}

function Line({ board, line, index, zones }: { board: Board; line: GlueLine; index: number; zones: ZonesState }) {
  const { doc, selection } = zones;
  const chosen = selection?.what === "glue-line" && selection.id === line.id;
  const boards = boardsAt(board, line);
  return (
    <div className={`flex items-end gap-2 rounded-md p-1 ${chosen ? "bg-chalk-wash" : ""}`}>
      <button
        type="button"
        aria-pressed={chosen}
        className="flex min-h-11 grow flex-col items-start justify-center rounded-md px-2 text-left hover:bg-chalk-wash"
        onClick={() => {
          zones.take("select");
          zones.select(chosen ? null : { what: "glue-line", id: line.id });
        }}
      >
        <span className="font-semibold">Glue line {index + 1}</span>
        {boards && <span className="text-sm text-pencil">{boards}</span>}
      </button>
      <div className="w-32 shrink-0">
        <LengthField
          label="From the upper edge"
          value={line.across}
          onChange={(across) => across !== null && zones.change(withGlueLine(doc, { ...line, across }))}
        />
      </div>
      <button
        type="button"
        aria-label={`Remove glue line ${index + 1}`}
        className="grid size-11 shrink-0 place-items-center rounded-md text-crayon hover:bg-crayon-wash"
        onClick={() => {
          zones.change(withoutGlueLine(doc, line.id));
          if (chosen) zones.select(null);
        }}
      >
        <Trash2 className="size-5" aria-hidden="true" />
      </button>
    </div>
  );
}

/** "B-041 above, B-042 below", as far as it is known. */
function boardsAt({ blank }: Board, { aboveBoardId, belowBoardId }: GlueLine): string {
  const tagOf = (boardId: string | null) => blank?.members.find((member) => member.boardId === boardId)?.tag;
  const [above, below] = [tagOf(aboveBoardId), tagOf(belowBoardId)];
  if (above && above === below) return `in ${above} itself`;
  return [above && `${above} above`, below && `${below} below`].filter(Boolean).join(", ");
}
