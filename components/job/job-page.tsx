"use client";
import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import Link from "next/link";
import { useState } from "react";
import { toast } from "sonner";
import { FaceDrawing } from "@/components/face/face-drawing";
import { JobPlace } from "@/components/movement/job-place";
import { Button, buttonClass } from "@/components/ui/button";
import { Empty } from "@/components/ui/empty";
import { Modal } from "@/components/ui/modal";
import { Notice } from "@/components/ui/notice";
import { PageTitle } from "@/components/ui/page-title";
import { messageOf } from "@/lib/client/fault-from-server";
import { deleteFace, jobKeys, jobQuery, updateJob } from "@/lib/client/job";
import type { FaceRow, Job } from "@/lib/schemas/job";
import { dayText } from "@/lib/words/day";
import { revisionLetter } from "@/lib/words/revision-letter";
import { JobForm } from "./job-form";

export function JobPage({ initial, mayEdit }: { initial: Job; mayEdit: boolean }) {
  const { data: job = initial, refetch } = useQuery({ ...jobQuery(initial.id), initialData: initial });
  const [editing, setEditing] = useState(false);
  // Each says in its own place what went wrong: the dialog, and the page under its heading.
  const change = useChangeJob(job.id);
  const openOrClose = useChangeJob(job.id);
  const closeDialog = () => {
    setEditing(false);
    // What others changed meanwhile is read only now: under an open dialog it would be overwritten unseen.
    if (change.error) refetch();
    change.reset();
  };
  const addFace = mayEdit && (
    <Link href={`/jobs/${job.id}/faces/new`} className={buttonClass("primary")}>
      Add a face
    </Link>
  );
  return (
    <>
      <PageTitle title={job.title} above={<JobFacts job={job} />}>
        {mayEdit && (
          <>
            <Button onClick={() => setEditing(true)}>Change</Button>
            <Button
              disabled={openOrClose.isPending}
              onClick={() =>
                openOrClose.mutate(
                  { baseRevision: job.revision, state: job.state === "open" ? "closed" : "open" },
                  { onError: () => refetch() },
                )
              }
            >
              {job.state === "open" ? "Close job" : "Open again"}
            </Button>
          </>
        )}
        {addFace}
      </PageTitle>
      {openOrClose.error && (
        <div className="px-4 pt-4 md:px-5">
          <Notice kind="stop">
            The job is not {openOrClose.variables.state === "closed" ? "closed" : "opened again"}. {messageOf(openOrClose.error)}
          </Notice>
        </div>
      )}
      {job.note && <p className="max-w-prose px-4 pt-4 whitespace-pre-line md:px-5">{job.note}</p>}
      {job.faceList.length === 0 ? (
        <Empty title="No faces yet" action={addFace}>
          A face is one visible surface: a row, a stack or a grid of fronts. Describe it, then lay it on a board.
        </Empty>
      ) : (
        <ul className="grid gap-4 p-4 md:grid-cols-2 md:p-5 xl:grid-cols-3">
          {job.faceList.map((face) => (
            <FaceCard key={face.id} job={job} face={face} mayEdit={mayEdit} />
          ))}
        </ul>
      )}
      <JobPlace job={job} mayEdit={mayEdit} />
      <Modal open={editing} onOpenChange={(open) => (open ? setEditing(true) : closeDialog())} title="Change job">
        <JobForm
          values={job}
          submit="Save"
          pending={change.isPending}
          error={change.error}
          onSubmit={(values) => change.mutate({ baseRevision: job.revision, ...values }, { onSuccess: () => setEditing(false) })}
        />
      </Modal>
    </>
  );
}

function useChangeJob(jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Parameters<typeof updateJob>[1]) => updateJob(jobId, body),
    onSuccess: (saved) => client.setQueryData(jobKeys.one(jobId), saved),
  });
}

function JobFacts({ job }: { job: Job }) {
  const facts = [
    `Job ${job.number}`,
    job.client,
    job.dueOn && `due ${dayText(job.dueOn)}`,
    job.state === "closed" && "closed",
  ].filter(Boolean);
  return <>{facts.join(" · ")}</>;
}

function FaceCard({ job, face, mayEdit }: { job: Job; face: FaceRow; mayEdit: boolean }) {
  return (
    <li className="flex flex-col gap-3 rounded-md border border-rule bg-sheet p-4">
      <div className="flex items-baseline justify-between gap-3">
        <h2 className="text-lg">
          <Link href={`/jobs/${job.id}/faces/${face.id}`} className="text-chalk underline-offset-4 hover:underline">
            {face.title}
          </Link>
        </h2>
        <span className="measure text-pencil">
          {face.pieces} {face.pieces === 1 ? "front" : "fronts"}
        </span>
      </div>
      <FaceDrawing face={face.face} className="h-32 w-full" />
      <p className="text-sm">
        {face.boards.length > 0 ? `On ${face.boards.join(", ")}` : "Not on wood yet"}
        {face.order && (
          <>
            {" · "}
            <Link href={`/orders/${face.order.id}`} className="text-chalk underline">
              Cut order {face.order.number} {revisionLetter(face.order.revision)}
            </Link>
            {face.order.superseded && <span className="text-crayon"> superseded: issue again</span>}
          </>
        )}
      </p>
      <div className="mt-auto flex gap-2">
        <Link href={`/jobs/${job.id}/faces/${face.id}`} className={buttonClass("plain", "small")}>
          Layout table
        </Link>
        {mayEdit && face.order === null && <RemoveFace jobId={job.id} face={face} />}
      </div>
    </li>
  );
}

function RemoveFace({ jobId, face }: { jobId: string; face: FaceRow }) {
  const client = useQueryClient();
  const [asking, setAsking] = useState(false);
  const remove = useMutation({
    mutationFn: () => deleteFace(face.id),
    onSuccess: () => client.invalidateQueries({ queryKey: jobKeys.one(jobId) }),
    onError: (error) => toast.error(messageOf(error)),
  });
  return (
    <>
      <Button kind="danger" size="small" onClick={() => setAsking(true)}>
        Remove
      </Button>
      <Modal
        open={asking}
        onOpenChange={setAsking}
        title={`Remove ${face.title}?`}
        lead="The face and its layout go. The boards stay in the rack."
      >
        <Button kind="danger" disabled={remove.isPending} onClick={() => remove.mutate()}>
          Remove face
        </Button>
      </Modal>
    </>
  );
}
