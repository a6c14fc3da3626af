import type { Metadata } from "next";
import Link from "next/link";
import { forbidden } from "next/navigation";
import { NewFaceForm } from "@/components/face/new-face-form";
import { PageTitle } from "@/components/ui/page-title";
import { pageAccess } from "@/lib/server/access";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readJob } from "@/lib/server/jobs/jobs";
import { shopSettings } from "@/lib/server/shops";

export const metadata: Metadata = { title: "Add a face" };

export default async function NewFacePage({ params }: { params: Promise<{ jobId: string }> }) {
  const { jobId } = await params;
  const access = await pageAccess(`/jobs/${jobId}/faces/new`);
  if (access.role === "assistant") forbidden();
  const job = await orNotFound(readJob(access, jobId));
  const { saws } = await shopSettings(access.shopId);
  return (
    <>
      <PageTitle
        title="Add a face"
        above={
          <Link href={`/jobs/${jobId}`} className="underline">
            {job.title}
          </Link>
        }
      />
      <NewFaceForm job={job} saws={saws} />
    </>
  );
}
