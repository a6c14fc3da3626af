"use client";
import { Check } from "lucide-react";
import type { BoardSide } from "@/lib/schemas/straightening";
import { Button } from "../ui/button";
import { PanelSection } from "../ui/panel-section";
import { cornerNames } from "./mark-words";
import { type MarkId, sameMark, turnCorners } from "./marks";
import type { MarkingState } from "./use-marking";

interface Props {
  marking: MarkingState;
  side: BoardSide;
  /** Shows the mark in the middle of the photograph and selects it. */
  onShow: (mark: MarkId) => void;
}

/** The corners one by one, which of them still waits, and the way to each. */
export function CornersPanel({ marking, side, onShow }: Props) {
  const { draft, change } = marking;
  return (
    <PanelSection
      title="Corners"
      lead={`The long edge with the grain is the upper or lower edge. ${side === "back" ? "The left end is the face's left end: turned over about its long edge, the board keeps it. " : ""}Drag every handle to its corner, or choose one here to go there.`}
    >
      {draft.reference === "sheet" && (
        <CornerList title="Sheet" of="sheet" names={["1", "2", "3", "4"]} marking={marking} onShow={onShow} />
      )}
      <CornerList title="Board" of="board" names={cornerNames} marking={marking} onShow={onShow} />
      <Button size="small" className="self-start" onClick={() => change(turnCorners)}>
        Turn the corners a quarter
      </Button>
    </PanelSection>
  );
}

interface ListProps extends Omit<Props, "side"> {
  title: string;
  of: "board" | "sheet";
  names: readonly string[];
}

function CornerList({ title, of, names, marking, onShow }: ListProps) {
  const unplaced = marking.draft.unplaced[of];
  return (
    <div>
      <h3 className="text-sm">{title}</h3>
      <ol className="mt-1 grid grid-cols-2 gap-2">
        {names.map((name, index) => (
          <li key={name}>
            <button
              type="button"
              aria-pressed={sameMark(marking.selected, { of, index })}
              className="flex min-h-11 w-full items-center gap-2 rounded-md border border-line bg-sheet px-2 text-left text-sm leading-tight hover:bg-chalk-wash aria-pressed:border-chalk aria-pressed:bg-chalk-wash"
              onClick={() => onShow({ of, index })}
            >
              <span className="measure grid size-6 shrink-0 place-items-center rounded-sm bg-chalk text-white">{index + 1}</span>
              <span className="grow">{of === "board" ? name : `Corner ${name}`}</span>
              {unplaced[index] ? (
                <span className="text-pencil whitespace-nowrap">to do</span>
              ) : (
                <Check className="size-4 shrink-0 text-moss" aria-label="placed" />
              )}
            </button>
          </li>
        ))}
      </ol>
    </div>
  );
}
