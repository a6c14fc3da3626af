"use client";
/** Looks through the whole rack for wood that could give the pieces in hand; boards come in as they are searched, the best first. */
import { useMutation } from "@tanstack/react-query";
import { useState } from "react";
import { usePictures } from "@/components/picture/use-pictures";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { Modal } from "@/components/ui/modal";
import { Notice } from "@/components/ui/notice";
import { messageOf } from "@/lib/client/fault-from-server";
import { putBoardOnTable } from "@/lib/client/layout";
import { takeOfferedPlace } from "@/lib/editor/commands/take-place";
import { groupsInHand } from "@/lib/editor/editor";
import { tableBoard } from "@/lib/editor/table-board";
import type { Um } from "@/lib/layout";
import type { FoundPlaceOnWire, SearchedBoard } from "@/lib/schemas/wood-search";
import { LeftOutList } from "./left-out-list";
import { boardToPaint, layoutAt } from "./offered-place";
import { PlaceCard } from "./place-card";
import { SearchProgress } from "./search-progress";
import { useEditorState, useTableContext } from "./table-context";
import { useWoodSearch } from "./use-wood-search";
import { WeightsForm } from "./weights-form";

interface Props {
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

export function FindWoodDialog({ open, onOpenChange }: Props) {
  return (
    <Modal
      open={open}
      onOpenChange={onOpenChange}
      wide
      title="Find wood"
      lead="The best place on every board of the rack that could give the pieces in hand."
    >
      <Wood onClose={() => onOpenChange(false)} />
    </Modal>
  );
}

interface Offered {
  readonly found: SearchedBoard;
  readonly place: FoundPlaceOnWire;
  readonly group: string;
}

function Wood({ onClose }: { onClose: () => void }) {
  const { editor, faceId } = useTableContext();
  const state = useWoodSearch();
  const atHand = usePictures();
  const layout = useEditorState(({ document }) => document.layout);
  const first = useEditorState(({ boards }) => boards[0]?.species ?? "");
  const [species, setSpecies] = useState(first);
  const [least, setLeast] = useState<Um | null>(null);
  const [most, setMost] = useState<Um | null>(null);
  const [groupId] = groupsInHand(editor.get());
  const taking = useMutation({
    mutationFn: ({ found }: Offered) => putBoardOnTable(faceId, found.boardId),
    onSuccess: (answer, { found, place, group }) => {
      const board = tableBoard(answer);
      const others = editor.get().boards.filter(({ face }) => face.id !== board.face.id);
      editor.setBoards([...others, board]);
      if (editor.run((document) => takeOfferedPlace(document, group, found.boardId, place))) onClose();
    },
  });
  const { search } = state;
  if (groupId === undefined) return <p>There are no pieces to find wood for.</p>;

  return (
    <div className="flex flex-col gap-4">
      <div className="grid gap-3 sm:grid-cols-3">
        <TextField label="Species" hint="Empty: any" value={species} onChange={(event) => setSpecies(event.target.value)} />
        <LengthField label="Thickness, least" value={least} onChange={setLeast} />
        <LengthField label="Thickness, most" value={most} onChange={setMost} />
      </div>
      <WeightsForm weights={state.weights} onChange={state.setWeights} />
      <div>
        <Button
          kind="primary"
          disabled={state.running || !state.ready}
          onClick={() =>
            state.start({
              groupId,
              boardId: null,
              species: species.trim() || null,
              leastThickness: least,
              mostThickness: most,
            })
          }
        >
          {search ? "Search again" : "Search the rack"}
        </Button>
      </div>
      <SearchProgress state={state} />
      {taking.isError && <Notice kind="stop">{messageOf(taking.error)}</Notice>}
      <p role="status" className="text-sm text-pencil empty:hidden">
        {search &&
          search.boards > 0 &&
          `${search.searched - search.leftOut} of ${search.boards - search.leftOut} boards searched; ${search.leftOut} left out.`}
      </p>
      <ol>
        {search?.found.map((found) => {
          const [place] = found.finding.places;
          const there = place && layoutAt(layout, search.groupId, found.boardId, place);
          if (!place || !there) return null;
          return (
            <PlaceCard
              key={found.boardId}
              title={`${found.tag}, ${found.species}`}
              place={place}
              layout={there}
              boards={[boardToPaint(found)]}
              atHand={atHand}
              onTake={editor.mayChange ? () => taking.mutate({ found, place, group: search.groupId }) : null}
            />
          );
        })}
      </ol>
      {search && search.leftOut > 0 && <LeftOutList searchId={search.id} />}
    </div>
  );
}
