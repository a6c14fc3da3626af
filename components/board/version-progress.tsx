"use client";
/** A picture in the making, or the last try that came to nothing. */
import { useMutation, useQuery } from "@tanstack/react-query";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useEffect } from "react";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { ProgressTape } from "@/components/ui/progress-tape";
import { messageOf } from "@/lib/client/fault-from-server";
import { cancelTask, taskEnded, taskQuery } from "@/lib/client/task";
import type { Straightening } from "@/lib/schemas/straightening";
import { markAddress } from "./board-address";

export function VersionProgress({ version, mayEdit }: { version: Straightening; mayEdit: boolean }) {
  const { photoId } = version;
  if (version.state === "waiting" && version.taskId !== null) {
    return <InTheMaking version={version} taskId={version.taskId} mayEdit={mayEdit} />;
  }
  if (version.state !== "failed") return null;
  return (
    <Notice kind="stop">
      Version {version.version} could not be made. {version.failure}{" "}
      {mayEdit && photoId !== null && (
        <Link href={markAddress(version.boardId, photoId, version.side)} className="font-semibold text-chalk underline">
          Mark again
        </Link>
      )}
    </Notice>
  );
}

function InTheMaking({ version: made, taskId, mayEdit }: { version: Straightening; taskId: string; mayEdit: boolean }) {
  const { version, photoId } = made;
  const doing = photoId === null ? "Composing" : "Straightening";
  const router = useRouter();
  const { data: task, error } = useQuery(taskQuery(taskId));
  const cancel = useMutation({ mutationFn: () => cancelTask(taskId) });
  const ended = task !== undefined && taskEnded(task);
  useEffect(() => {
    if (ended) router.refresh();
  }, [ended, router]);
  return (
    <div className="flex flex-col gap-2 rounded-md border border-rule bg-sheet p-4">
      <p role="status">{task?.state === "running" ? `${doing} version ${version}.` : `Version ${version} waits for its turn.`}</p>
      <ProgressTape label={`${doing} version ${version}`} done={Math.round((task?.progress ?? 0) * 100)} of={100} />
      {error && <Notice kind="care">{messageOf(error)} It is being worked on all the same.</Notice>}
      {cancel.isError && <Notice kind="stop">{messageOf(cancel.error)}</Notice>}
      {mayEdit && (
        <Button
          className="self-start"
          size="small"
          disabled={cancel.isPending || cancel.isSuccess}
          onClick={() => cancel.mutate()}
        >
          {cancel.isSuccess ? "Stopping" : "Cancel"}
        </Button>
      )}
    </div>
  );
}
