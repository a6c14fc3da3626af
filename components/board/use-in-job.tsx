"use client";
/** Puts a board on the table of a face, and goes there. */
import { useMutation, useQuery } from "@tanstack/react-query";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { SelectField } from "@/components/ui/field";
import { Modal } from "@/components/ui/modal";
import { Notice } from "@/components/ui/notice";
import { messageOf } from "@/lib/client/fault-from-server";
import { jobQuery, jobsQuery } from "@/lib/client/job";
import { putBoardOnTable } from "@/lib/client/layout";
import type { Board } from "@/lib/schemas/board";

interface Props {
  board: Board;
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

export function UseInJob({ board, open, onOpenChange }: Props) {
  const router = useRouter();
  const [jobId, setJobId] = useState("");
  const jobs = useQuery({ ...jobsQuery({ state: "open", pageSize: 100 }), enabled: open });
  const job = useQuery({ ...jobQuery(jobId), enabled: jobId !== "" });
  const put = useMutation({
    mutationFn: (faceId: string) => putBoardOnTable(faceId, board.id),
    onSuccess: (_, faceId) => router.push(`/jobs/${jobId}/faces/${faceId}`),
  });
  const error = jobs.error ?? job.error ?? put.error;
  return (
    <Modal open={open} onOpenChange={onOpenChange} title={`Use ${board.tag} in a job`} lead="It goes on the table of a face.">
      <div className="flex flex-col gap-4">
        {jobs.data?.items.length === 0 ? (
          <p>
            No job is open.{" "}
            <Link href="/jobs" className="text-chalk underline">
              Open one
            </Link>
          </p>
        ) : (
          <SelectField label="Job" value={jobId} onChange={(event) => setJobId(event.target.value)}>
            <option value="">choose a job</option>
            {jobs.data?.items.map(({ id, number, title }) => (
              <option key={id} value={id}>
                {number} {title}
              </option>
            ))}
          </SelectField>
        )}
        {job.data && job.data.faceList.length === 0 && (
          <p>
            This job has no face yet.{" "}
            <Link href={`/jobs/${jobId}/faces/new`} className="text-chalk underline">
              Add a face
            </Link>
          </p>
        )}
        <ul className="flex flex-col gap-2">
          {job.data?.faceList.map((face) => (
            <li key={face.id} className="flex items-center justify-between gap-3">
              <span>{face.title}</span>
              <Button
                size="small"
                disabled={put.isPending}
                onClick={() => put.mutate(face.id)}
                aria-label={`Use for ${face.title}`}
              >
                Use here
              </Button>
            </li>
          ))}
        </ul>
        {error && <Notice kind="stop">{messageOf(error)}</Notice>}
      </div>
    </Modal>
  );
}
