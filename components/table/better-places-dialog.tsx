"use client";
/** Better places for the pieces in hand on the board they lie on: every place weighed, the best five that really differ shown. */
import { usePictures } from "@/components/picture/use-pictures";
import { Button } from "@/components/ui/button";
import { Modal } from "@/components/ui/modal";
import { takeOfferedPlace } from "@/lib/editor/commands/take-place";
import { groupsInHand } from "@/lib/editor/editor";
import { groupById } from "@/lib/layout";
import { layoutAt } from "./offered-place";
import { PlaceCard } from "./place-card";
import { SearchProgress } from "./search-progress";
import { useEditorState, useTableContext } from "./table-context";
import { useWoodSearch } from "./use-wood-search";
import { WeightsForm } from "./weights-form";

interface Props {
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

/** On one board it says nothing. */
const without = ["stock"] as const;

export function BetterPlacesDialog({ open, onOpenChange }: Props) {
  return (
    <Modal
      open={open}
      onOpenChange={onOpenChange}
      wide
      title="Better places on this board"
      lead="Every place of the pieces in hand is weighed, both ways round. The eye is the last judge."
    >
      <Places onClose={() => onOpenChange(false)} />
    </Modal>
  );
}

function Places({ onClose }: { onClose: () => void }) {
  const { editor } = useTableContext();
  const state = useWoodSearch();
  const atHand = usePictures();
  const layout = useEditorState(({ document }) => document.layout);
  const boards = useEditorState((table) => table.boards);
  const [groupId] = groupsInHand(editor.get());
  const stockId = groupId === undefined ? undefined : groupById(layout, groupId)?.placement?.stockId;
  const { search } = state;
  const found = search?.found[0];
  if (groupId === undefined || stockId === undefined) {
    return <p>Lay the pieces on a board first. To search the whole rack, take “Find wood”.</p>;
  }
  return (
    <div className="flex flex-col gap-4">
      <WeightsForm weights={state.weights} onChange={state.setWeights} without={without} />
      <div>
        <Button
          kind="primary"
          disabled={state.running || !state.ready}
          onClick={() => state.start({ groupId, boardId: stockId, species: null, leastThickness: null, mostThickness: null })}
        >
          {search ? "Search again" : "Search this board"}
        </Button>
      </div>
      <SearchProgress state={state} />
      <p role="status" className="text-sm text-pencil empty:hidden">
        {search?.state === "done" &&
          (found
            ? `${found.finding.positions.toLocaleString("en-GB")} places weighed, ${found.finding.allowed.toLocaleString("en-GB")} of them on sound wood.`
            : "There is no sound place for these pieces on this board.")}
      </p>
      <ol>
        {found?.finding.places.map((place, index) => {
          const there = search && layoutAt(layout, search.groupId, found.boardId, place);
          if (!search || !there) return null;
          const take = () => {
            if (editor.run((document) => takeOfferedPlace(document, search.groupId, found.boardId, place))) onClose();
          };
          return (
            <PlaceCard
              // biome-ignore lint/suspicious/noArrayIndexKey: a place is its rank
              key={index}
              title={`Place ${index + 1}`}
              place={place}
              layout={there}
              boards={boards}
              atHand={atHand}
              onTake={editor.mayChange ? take : null}
              without={without}
            />
          );
        })}
      </ol>
    </div>
  );
}
