"use client";
import { useMutation, useQuery } from "@tanstack/react-query";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Empty } from "@/components/ui/empty";
import { Modal } from "@/components/ui/modal";
import { Notice } from "@/components/ui/notice";
import { PageTitle } from "@/components/ui/page-title";
import { Pager } from "@/components/ui/pager";
import { messageOf } from "@/lib/client/fault-from-server";
import { createJob, jobsQuery } from "@/lib/client/job";
import type { JobRow } from "@/lib/schemas/job";
import { dayText } from "@/lib/words/day";
import { JobForm } from "./job-form";
import { useJobListState } from "./use-job-list-state";

export function JobList({ mayEdit }: { mayEdit: boolean }) {
  const [list, change] = useJobListState();
  const { state, search } = list;
  const [opening, setOpening] = useState(false);
  const jobs = useQuery(jobsQuery(list));
  const openJob = mayEdit ? (
    <Button kind="primary" onClick={() => setOpening(true)}>
      Open a job
    </Button>
  ) : null;

  return (
    <>
      <PageTitle title="Jobs">
        <input
          type="search"
          aria-label="Search jobs"
          placeholder="Title, client or number"
          className="min-h-11 w-full rounded-md border border-line bg-sheet px-3 placeholder:text-pencil md:min-h-10 md:w-60"
          value={search}
          onChange={(event) => change({ search: event.target.value })}
        />
        <Button onClick={() => change({ state: state === "open" ? "closed" : "open" })}>
          {state === "open" ? "Show closed jobs" : "Show open jobs"}
        </Button>
        {openJob}
      </PageTitle>
      <div className="px-4 md:px-5">
        {jobs.isError && (
          <div className="flex flex-col items-start gap-3 py-4">
            <Notice kind="stop">{messageOf(jobs.error)}</Notice>
            <Button disabled={jobs.isFetching} onClick={() => void jobs.refetch()}>
              Try again
            </Button>
          </div>
        )}
        {jobs.isPending && (
          <p role="status" className="py-8 text-pencil">
            Looking up the jobs.
          </p>
        )}
        {jobs.data?.total === 0 && search === "" && state === "open" && (
          <Empty title="No jobs yet" action={openJob}>
            A job is a piece of furniture. It holds the faces you lay out on boards, and the cut orders made from them.
          </Empty>
        )}
        {jobs.data?.total === 0 && (search !== "" || state === "closed") && (
          <p className="py-8 text-pencil">{search === "" ? "No job is closed yet." : `No ${state} job fits “${search}”.`}</p>
        )}
        {jobs.data && jobs.data.total > 0 && <JobRows jobs={jobs.data.items} />}
        {jobs.data && <Pager {...jobs.data} onPage={(page) => change({ page })} />}
      </div>
      <OpenJobDialog open={opening} onOpenChange={setOpening} />
    </>
  );
}

function JobRows({ jobs }: { jobs: readonly JobRow[] }) {
  return (
    <ul className="divide-y divide-rule">
      {jobs.map((job) => (
        <li key={job.id}>
          <Link
            href={`/jobs/${job.id}`}
            className="grid gap-x-6 gap-y-1 py-4 hover:bg-sheet md:grid-cols-[4rem_1fr_14rem_8rem_9rem] md:items-baseline md:px-2"
          >
            <span className="measure text-pencil">
              <span className="md:sr-only">Job </span>
              {job.number}
            </span>
            <span className="text-lg font-semibold">{job.title}</span>
            <span className="text-pencil">{job.client}</span>
            <span className="measure">
              {job.faces} {job.faces === 1 ? "face" : "faces"}
            </span>
            <span className="measure text-pencil">{job.dueOn && `due ${dayText(job.dueOn)}`}</span>
          </Link>
        </li>
      ))}
    </ul>
  );
}

function OpenJobDialog({ open, onOpenChange }: { open: boolean; onOpenChange: (open: boolean) => void }) {
  const router = useRouter();
  const create = useMutation({ mutationFn: createJob, onSuccess: (job) => router.push(`/jobs/${job.id}`) });
  return (
    <Modal open={open} onOpenChange={onOpenChange} title="Open a job">
      <JobForm
        values={{ title: "", client: "", note: "", dueOn: null }}
        submit="Open job"
        pending={create.isPending || create.isSuccess}
        error={create.error}
        onSubmit={(values) => create.mutate(values)}
      />
    </Modal>
  );
}
