"use client";
/** Which face of the board the photograph shows. The back is offered once there is a face to turn over. */
import { BoardStrip } from "@/components/board/board-strip";
import type { Board } from "@/lib/schemas/board";
import type { BoardSide } from "@/lib/schemas/straightening";
import { Choice } from "../ui/choice";
import { PanelSection } from "../ui/panel-section";

interface Props {
  board: Board;
  side: BoardSide;
  onSide: (side: BoardSide) => void;
}

export function SidePanel({ board, side, onSide }: Props) {
  if (board.straighteningId === null) return null;
  return (
    <PanelSection title="Which face is it?">
      <Choice
        legend="The photograph shows"
        value={side}
        options={[
          { value: "face", label: "the face" },
          { value: "back", label: "the back" },
        ]}
        onChange={onSide}
      />
      {side === "back" && (
        <figure>
          <BoardStrip board={board} lazy={false} />
          <figcaption className="mt-1 text-sm text-pencil">
            The face, to find its ends by. Turned over about its long edge, its left end stays left and its upper edge comes to
            lie below.
          </figcaption>
        </figure>
      )}
    </PanelSection>
  );
}
