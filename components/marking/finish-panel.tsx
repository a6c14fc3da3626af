"use client";
import { useMutation } from "@tanstack/react-query";
import { messageOf } from "@/lib/client/fault-from-server";
import { startStraightening } from "@/lib/client/straightening";
import type { Marking } from "@/lib/layout";
import type { Board } from "@/lib/schemas/board";
import type { Photo } from "@/lib/schemas/photo";
import type { BoardSide, Straightening } from "@/lib/schemas/straightening";
import { SidesNotice } from "../board/sides-notice";
import { Button } from "../ui/button";
import { Notice } from "../ui/notice";
import { PanelSection } from "../ui/panel-section";
import { FitReport } from "./fit-report";
import type { MarkingState } from "./use-marking";

interface Props {
  board: Board;
  photo: Photo;
  marking: MarkingState;
  side: BoardSide;
  onStarted: (started: Straightening) => void;
}

/** What the marks give, and the button that makes the picture of them. */
export function FinishPanel({ board, photo, marking, side, onStarted }: Props) {
  const { outcome, fit } = marking;
  const start = useMutation({
    mutationFn: async () => {
      if (!outcome.complete) throw new Error("Put the marks in their place first.");
      return startStraightening(board.id, { photoId: photo.id, marking: wireOf(outcome.marking), side });
    },
    onSuccess: onStarted,
  });
  return (
    <PanelSection title="Straighten" lead="Makes the picture true to scale. It becomes a new version; layouts keep theirs.">
      <FitReport marking={marking} />
      {side === "back" && fit?.ok && <SidesNotice face={board} back={fit} />}
      {start.error && <Notice kind="stop">{messageOf(start.error)}</Notice>}
      <Button kind="primary" disabled={!fit?.ok || start.isPending} onClick={() => start.mutate()}>
        Straighten
      </Button>
    </PanelSection>
  );
}

/** The wire's lists may be written to, the core's may not. */
function wireOf(marking: Marking) {
  const { reference, corners, extraPoints, edgePoints } = marking;
  const copied = ([a, b, c, d]: typeof corners): [typeof a, typeof b, typeof c, typeof d] => [a, b, c, d];
  return {
    reference: reference.kind === "sheet" ? { ...reference, corners: copied(reference.corners) } : reference,
    corners: copied(corners),
    extraPoints: [...extraPoints],
    edgePoints: [...edgePoints],
  };
}
