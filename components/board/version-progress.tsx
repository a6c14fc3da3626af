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

export function VersionProgress({ version, mayEdit }: { version: Straightening; mayEdit: boolean }) {
  if (version.state === "waiting" && version.taskId !== null) {
    return <InTheMaking version={version.version} taskId={version.taskId} mayEdit={mayEdit} />;
  }
  if (version.state !== "failed") return null;
  return (
    <Notice kind="stop">
      Version {version.version} could not be made. {version.failure}{" "}
      {mayEdit && (
        <Link href={`/rack/${version.boardId}/mark?photo=${version.photoId}`} className="font-semibold text-chalk underline">
          Mark again
        </Link>
      )}
    </Notice>
  );
}

function InTheMaking({ version, taskId, mayEdit }: { version: number; taskId: string; mayEdit: boolean }) {
  const router = useRouter();
  const { data: task, error } = useQuery(taskQuery(taskId));
  const cancel = useMutation({ mutationFn: () => cancelTask(taskId) });
  const ended = task !== undefined && taskEnded(task);
  useEffect(() => {
    if (ended) router.refresh();
  }, [ended, router]);
  return (
    <div className="flex flex-col gap-2 rounded-md border border-rule bg-sheet p-4">
      <p role="status">
        {task?.state === "running" ? `Straightening version ${version}.` : `Version ${version} waits for its turn.`}
      </p>
      <ProgressTape label={`Straightening version ${version}`} done={Math.round((task?.progress ?? 0) * 100)} of={100} />
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
