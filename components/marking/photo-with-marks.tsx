"use client";
import type { Photo } from "@/lib/schemas/photo";
/** The photograph with its marks on it, and the loupe while one of them moves. */
import { Handle } from "../picture/handle";
import { Loupe } from "../picture/loupe";
import { loupeCorner } from "../picture/loupe-place";
import { PictureStage } from "../picture/picture-stage";
import type { StageView } from "../picture/use-stage-view";
import { toScreen } from "../picture/view";
import { MarkLook } from "./mark-look";
import { markName, positionWords } from "./mark-words";
import { MarkedLines } from "./marked-lines";
import { type MarkId, markAt, marksOf, sameMark } from "./marks";
import type { MarkingState } from "./use-marking";

const LOUPE_PX = 136;
/** Tenths of a photo pixel with Alt. */
const FINE_STEP_PX = 0.1;
/** The loupe shows things this many times larger than the photograph beside it, but never smaller than this. */
const LOUPE_MAGNIFIES = 6;
const LEAST_LOUPE_SCALE = 0.8;

interface Props {
  photo: Photo;
  stage: StageView;
  marking: MarkingState;
  /** The full-size level, once loaded. */
  image: HTMLImageElement | null;
}

export function PhotoWithMarks({ photo, stage, marking, image }: Props) {
  const { draft, selected, adding, moving } = marking;
  const size = marking.photo;
  const movingAt = moving && markAt(draft, moving);
  return (
    <PictureStage
      label={`Photograph ${photo.fileName}`}
      stage={stage}
      size={size}
      levels={photo.levels}
      onTap={adding ? marking.tap : undefined}
      onEscape={() => (adding ? marking.add(null) : marking.select(null))}
      crossHair={adding !== null}
      className="h-[54dvh] min-h-72 lg:h-[calc(100dvh-19rem)]"
    >
      <MarkedLines draft={draft} view={stage.view} frame={stage.frame} />
      {marksOf(draft).map((mark) => (
        <OneHandle
          key={`${mark.of}-${mark.index}`}
          mark={mark}
          stage={stage}
          marking={marking}
          selected={sameMark(mark, selected)}
        />
      ))}
      {movingAt && (
        <div
          data-testid="loupe"
          className={`absolute top-2 z-20 overflow-hidden rounded-md border-2 border-sheet outline outline-line ${loupeCorner(toScreen(stage.view, movingAt), stage.frame) === "left" ? "left-2" : "right-2"}`}
        >
          <Loupe
            image={image}
            picture={size}
            at={movingAt}
            scale={Math.max(LEAST_LOUPE_SCALE, stage.view.scale * LOUPE_MAGNIFIES)}
            widthPx={LOUPE_PX}
            heightPx={LOUPE_PX}
          />
        </div>
      )}
    </PictureStage>
  );
}

function OneHandle({
  mark,
  stage,
  marking,
  selected,
}: {
  mark: MarkId;
  stage: StageView;
  marking: MarkingState;
  selected: boolean;
}) {
  const at = markAt(marking.draft, mark);
  if (!at) return null;
  const unplaced =
    (mark.of === "board" && marking.draft.unplaced.board[mark.index]) ||
    (mark.of === "sheet" && marking.draft.unplaced.sheet[mark.index]) ||
    false;
  return (
    <Handle
      name={markName(mark)}
      position={unplaced ? "not placed yet" : positionWords(at)}
      at={at}
      view={stage.view}
      fineStep={FINE_STEP_PX}
      selected={selected}
      onSelect={() => marking.select(mark)}
      onMove={(to, phase) => marking.move(mark, to, phase)}
      onRemove={mark.of === "extra" || mark.of === "edge" ? () => marking.remove(mark) : undefined}
    >
      <MarkLook mark={mark} selected={selected} unplaced={unplaced} />
    </Handle>
  );
}
