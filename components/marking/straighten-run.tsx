"use client";
/** The making of the picture, watched, and the picture when it is there. */
import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import Image from "next/image";
import Link from "next/link";
import { useEffect } from "react";
import { boardKeys } from "@/lib/client/board";
import { messageOf } from "@/lib/client/fault-from-server";
import { straighteningQuery } from "@/lib/client/straightening";
import { cancelTask, taskEnded, taskQuery } from "@/lib/client/task";
import type { Straightening } from "@/lib/schemas/straightening";
import { zonesAddress } from "../board/board-address";
import { WoodStrip } from "../picture/wood-strip";
import { Button, buttonClass } from "../ui/button";
import { Notice } from "../ui/notice";
import { ProgressTape } from "../ui/progress-tape";

interface Props {
  started: Straightening;
  onAgain: () => void;
}

export function StraightenRun({ started, onAgain }: Props) {
  const client = useQueryClient();
  const { data: task, error } = useQuery({ ...taskQuery(started.taskId ?? ""), enabled: started.taskId !== null });
  const ended = started.taskId === null || (task !== undefined && taskEnded(task));
  const { data: version } = useQuery({ ...straighteningQuery(started.id), enabled: ended });
  const cancel = useMutation({ mutationFn: () => cancelTask(started.taskId ?? "") });

  useEffect(() => {
    if (!ended) return;
    void client.invalidateQueries({ queryKey: boardKeys.all });
  }, [ended, client]);

  if (version?.state === "done") return <Finished version={version} onAgain={onAgain} />;
  if (version?.state === "failed" || version?.state === "cancelled") {
    return (
      <div className="flex flex-col items-start gap-3">
        <Notice kind={version.state === "failed" ? "stop" : "plain"}>
          {version.state === "failed"
            ? (version.failure ?? "The picture could not be made. Check the marks and try again.")
            : "Stopped. Nothing was changed."}
        </Notice>
        <Button onClick={onAgain}>Back to the marks</Button>
      </div>
    );
  }
  return (
    <div className="flex flex-col gap-3">
      <p>
        <span role="status">{task?.state === "running" ? "Straightening the photograph." : "Waiting for its turn."}</span>{" "}
        <span className="measure">{Math.round((task?.progress ?? 0) * 100)} %</span>
      </p>
      <ProgressTape label="Straightening" done={Math.round((task?.progress ?? 0) * 100)} of={100} />
      {error && <Notice kind="care">{messageOf(error)} It is being worked on all the same.</Notice>}
      {cancel.error && <Notice kind="stop">{messageOf(cancel.error)}</Notice>}
      <Button className="self-start" disabled={cancel.isPending || cancel.isSuccess} onClick={() => cancel.mutate()}>
        {cancel.isPending || cancel.isSuccess ? "Stopping" : "Cancel"}
      </Button>
    </div>
  );
}

function Finished({ version, onAgain }: { version: Straightening; onAgain: () => void }) {
  return (
    <div className="flex flex-col gap-3">
      <Notice kind="sound">
        Version {version.version}
        {version.side === "back" ? ", the picture of the back, is done." : " of the picture is done."}
      </Notice>
      <WoodStrip label="Straightened picture" length={version.length} width={version.width}>
        {({ width, height }) => {
          const wanted = width * window.devicePixelRatio;
          const level = version.levels.findLast(({ widthPx }) => widthPx >= wanted) ?? version.levels[0];
          return (
            level && (
              <Image
                src={level.url}
                alt="The straightened board"
                width={level.widthPx}
                height={level.heightPx}
                unoptimized
                className="block max-w-none"
                style={{ width, height }}
              />
            )
          );
        }}
      </WoodStrip>
      <div className="flex flex-wrap gap-2">
        <Link href={zonesAddress(version.boardId, version.side)} className={buttonClass("primary")}>
          Draw outline and keep-clear areas
        </Link>
        <Link href={`/rack/${version.boardId}`} className={buttonClass()}>
          Back to the board
        </Link>
        <Button kind="quiet" onClick={onAgain}>
          Mark again
        </Button>
      </div>
    </div>
  );
}
