"use client";
/** Bringing a photograph of a board to scale: corners, what has a known size, the checks, and the straightening. */
import Link from "next/link";
import { useEffect, useMemo, useState } from "react";
import type { Board } from "@/lib/schemas/board";
import type { Photo } from "@/lib/schemas/photo";
import type { BoardSide, Straightening } from "@/lib/schemas/straightening";
import { useImage } from "../picture/use-image";
import { useStageView } from "../picture/use-stage-view";
import { Notice } from "../ui/notice";
import { PageTitle } from "../ui/page-title";
import { PanelSection } from "../ui/panel-section";
import { useUnsavedWarning } from "../ui/use-unsaved-warning";
import { CornersPanel } from "./corners-panel";
import { type Draft, draftFrom, freshDraft } from "./draft";
import { EdgePointsPanel } from "./edge-points-panel";
import { ExtraPointsPanel } from "./extra-points-panel";
import { FineAdjust } from "./fine-adjust";
import { FinishPanel } from "./finish-panel";
import { MarksNotice } from "./fit-report";
import { KnownDistancePanel } from "./known-distance-panel";
import { markName, positionWords } from "./mark-words";
import { type MarkId, markAt } from "./marks";
import { PhotoWithMarks } from "./photo-with-marks";
import { Preview } from "./preview";
import { ReferencePanel } from "./reference-panel";
import { SidePanel } from "./side-panel";
import { StraightenRun } from "./straighten-run";
import { type Adding, type MarkingState, useMarking } from "./use-marking";

/** CSS pixels per photo pixel at the nearest zoom: a pixel is then a square one can point at. */
const MOST_SCALE = 12;
/** Around the whole photograph, for names beside a board that fills it. */
const MARGIN_PX = 34;
/** Choosing a corner from the list zooms in at least this far. */
const SCALE_AT_CORNER = 0.5;

interface Props {
  board: Board;
  photo: Photo;
  /** The version to start from; its marks hold only on the photograph they were made on. */
  previous: Straightening | null;
  /** Which face of the board the photograph is thought to show. */
  side: BoardSide;
}

export function MarkingScreen({ board, photo, previous, side: givenSide }: Props) {
  const [side, setSide] = useState(givenSide);
  const size = useMemo(() => ({ width: photo.widthPx, height: photo.heightPx }), [photo.widthPx, photo.heightPx]);
  const marking = useMarking(size, () =>
    previous?.photoId === photo.id && previous.marking ? draftFrom(previous.marking, size, board) : freshDraft(size, board),
  );
  const stage = useStageView(size, MOST_SCALE, MARGIN_PX);
  const { image, state } = useImage(photo.levels[0]?.url ?? null);
  const [started, setStarted] = useState<Straightening | null>(null);
  // Marks once sent are kept with their version, whatever becomes of its picture.
  const [sent, setSent] = useState<Draft | null>(null);
  useUnsavedWarning(marking.dirty && marking.draft !== sent);
  const fit = marking.fit?.ok ? marking.fit : null;
  const { reveal } = stage;
  const { adding } = marking;
  // Tapping follows, on a phone far above the button that asked for it.
  useEffect(() => {
    if (adding) reveal();
  }, [adding, reveal]);

  const show = (mark: MarkId) => {
    const at = markAt(marking.draft, mark);
    if (at) stage.lookAt(at, SCALE_AT_CORNER);
    marking.select(mark);
  };
  return (
    <>
      <PageTitle
        title={side === "back" ? `Mark the back of ${board.tag}` : `Mark ${board.tag}`}
        above={
          <Link href={`/rack/${board.id}`} className="underline">
            {board.tag}, {board.species}
          </Link>
        }
      />
      {started && (
        <PanelSection title="Straighten">
          <StraightenRun started={started} onAgain={() => setStarted(null)} />
        </PanelSection>
      )}
      {/* Only hidden meanwhile: the view of the photograph is found again as it was left. */}
      <div hidden={started !== null} className="lg:grid lg:grid-cols-[minmax(0,1fr)_25rem]">
        <div className="min-w-0 lg:sticky lg:top-0 lg:self-start">
          <PhotoWithMarks photo={photo} stage={stage} marking={marking} image={image} />
          {state === "failed" && (
            <Notice kind="stop">The photograph could not be loaded. Check the connection and load the page again.</Notice>
          )}
          <AddingNotice adding={adding} onDone={() => marking.add(null)} />
          <div className="px-4 py-3">
            <MarksNotice marking={marking} />
            {fit && (
              <>
                <h2 className="pb-2 text-lg">As it will come out</h2>
                <Preview photo={photo} fit={fit} />
              </>
            )}
          </div>
        </div>
        <div className="border-rule bg-sheet lg:border-l">
          <SelectedMark marking={marking} image={image} />
          <SidePanel board={board} side={side} onSide={setSide} />
          <ReferencePanel marking={marking} />
          <CornersPanel marking={marking} side={side} onShow={show} />
          {/* Before what is optional: four corners are enough for most boards. */}
          <FinishPanel
            board={board}
            photo={photo}
            marking={marking}
            side={side}
            onStarted={(version) => {
              setSent(marking.draft);
              setStarted(version);
            }}
          />
          <EdgePointsPanel marking={marking} onShow={show} />
          <ExtraPointsPanel marking={marking} onShow={show} />
          <KnownDistancePanel marking={marking} />
        </div>
      </div>
      <Spoken marking={marking} />
    </>
  );
}

function SelectedMark({ marking, image }: { marking: MarkingState; image: HTMLImageElement | null }) {
  const { selected, draft } = marking;
  const at = selected && markAt(draft, selected);
  if (!selected || !at) return null;
  return (
    <div className="border-b border-rule px-4 py-4">
      <FineAdjust
        name={markName(selected)}
        image={image}
        picture={marking.photo}
        at={at}
        onMove={(to) => marking.move(selected, to)}
      />
    </div>
  );
}

const addingWords: Readonly<Record<Adding, string>> = {
  extra: "Tap the photograph where the point is.",
  edge: "Tap along a straight edge. Each point goes to the edge it is nearest to.",
  "known-from": "Tap one end of the distance.",
  "known-to": "Tap the other end.",
};

function AddingNotice({ adding, onDone }: { adding: Adding | null; onDone: () => void }) {
  if (!adding) return null;
  return (
    <div className="px-4 pt-3">
      <Notice kind="care">
        {addingWords[adding]}{" "}
        <span className="pointer-coarse:hidden">
          With the keyboard: move the photograph under the cross-hair and press Enter.{" "}
        </span>
        <button type="button" className="min-h-6 font-semibold text-chalk underline pointer-coarse:min-h-11" onClick={onDone}>
          Done
        </button>
      </Notice>
    </div>
  );
}

/** Says where the selected mark is, once it rests: a screen reader would talk over itself while it moves. */
function Spoken({ marking }: { marking: MarkingState }) {
  const { selected, draft } = marking;
  const at = selected && markAt(draft, selected);
  return (
    <p className="sr-only" aria-live="polite">
      {selected && at ? `${markName(selected)}: ${positionWords(at)}` : ""}
    </p>
  );
}
