import type { Metadata } from "next";
import { JobPage } from "@/components/job/job-page";
import { pageAccess } from "@/lib/server/access";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readJob } from "@/lib/server/jobs/jobs";

export const metadata: Metadata = { title: "Job" };

export default async function OneJobPage({ params }: { params: Promise<{ jobId: string }> }) {
  const { jobId } = await params;
  const access = await pageAccess(`/jobs/${jobId}`);
  const job = await orNotFound(readJob(access, jobId));
  return <JobPage initial={job} mayEdit={access.role !== "assistant"} />;
}
