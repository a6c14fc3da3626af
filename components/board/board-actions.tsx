"use client";
/** What a maker can do with a board, at the head of its page. */
import Link from "next/link";
import { useState } from "react";
import { Button, buttonClass } from "@/components/ui/button";
import type { Board } from "@/lib/schemas/board";
import type { BoardSide, Straightening } from "@/lib/schemas/straightening";
import { blankAddress, zonesAddress } from "./board-address";
import { ChoosePhoto } from "./choose-photo";
import { UseInJob } from "./use-in-job";

interface Props {
  board: Board;
  /** Newest first. */
  versions: readonly Straightening[];
}

export function BoardActions({ board, versions }: Props) {
  const [open, setOpen] = useState<BoardSide | "job" | null>(null);
  const close = (isOpen: boolean) => setOpen(isOpen ? open : null);
  const marked = board.straighteningId !== null;
  const free = board.inBlank === null && board.state === "rack";
  return (
    <>
      <Button kind={marked ? "plain" : "primary"} onClick={() => setOpen("face")}>
        {marked ? "Mark again" : "Mark a photograph"}
      </Button>
      {marked && (
        <>
          {board.backStraighteningId === null && <Button onClick={() => setOpen("back")}>Photograph the back</Button>}
          <Link href={zonesAddress(board.id, "face")} className={buttonClass()}>
            Outline and areas
          </Link>
        </>
      )}
      {marked && free && (
        <>
          {board.blank === null && (
            <Link href={blankAddress(board.id)} className={buttonClass()}>
              Glue up
            </Link>
          )}
          <Button kind="primary" onClick={() => setOpen("job")}>
            Use in a job
          </Button>
        </>
      )}
      {(["face", "back"] as const).map((side) => (
        <ChoosePhoto
          key={side}
          boardId={board.id}
          side={side}
          lastPhotoId={lastPhotoOf(versions, side)}
          open={open === side}
          onOpenChange={close}
        />
      ))}
      <UseInJob board={board} open={open === "job"} onOpenChange={close} />
    </>
  );
}

/** The same for its back, beside the picture of it. */
export function BackActions({ board, versions }: Props) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button size="small" onClick={() => setOpen(true)}>
        Mark the back again
      </Button>
      <Link href={zonesAddress(board.id, "back")} className={buttonClass("plain", "small")}>
        Outline and areas of the back
      </Link>
      <ChoosePhoto
        boardId={board.id}
        side="back"
        lastPhotoId={lastPhotoOf(versions, "back")}
        open={open}
        onOpenChange={setOpen}
      />
    </>
  );
}

const lastPhotoOf = (versions: Props["versions"], side: BoardSide): string | null =>
  versions.find((version) => version.side === side)?.photoId ?? null;
