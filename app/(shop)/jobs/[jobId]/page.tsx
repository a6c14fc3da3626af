import type { Metadata } from "next";
import { cache } from "react";
import { JobPage } from "@/components/job/job-page";
import { pageAccess } from "@/lib/server/access";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readJob } from "@/lib/server/jobs/jobs";

interface Props {
  params: Promise<{ jobId: string }>;
}

const jobFor = cache(async (jobId: string) => {
  const access = await pageAccess(`/jobs/${jobId}`);
  return { access, job: await orNotFound(readJob(access, jobId)) };
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { job } = await jobFor((await params).jobId);
  return { title: job.title };
}

export default async function OneJobPage({ params }: Props) {
  const { access, job } = await jobFor((await params).jobId);
  return <JobPage initial={job} mayEdit={access.role !== "assistant"} />;
}
