import type { Metadata } from "next";
import { JobList } from "@/components/job/job-list";
import { pageAccess } from "@/lib/server/access";

export const metadata: Metadata = { title: "Jobs" };

export default async function JobsPage() {
  const { role } = await pageAccess("/jobs");
  return <JobList mayEdit={role !== "assistant"} />;
}
