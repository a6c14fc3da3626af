import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { cache } from "react";
import { LayoutTable } from "@/components/table/layout-table";
import { pageAccess } from "@/lib/server/access";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { shopSettings } from "@/lib/server/shops";

interface Props {
  params: Promise<{ jobId: string; faceId: string }>;
}

const layoutFor = cache(async (jobId: string, faceId: string) => {
  const access = await pageAccess(`/jobs/${jobId}/faces/${faceId}`);
  const layout = await orNotFound(readLayout(access, faceId));
  if (layout.jobId !== jobId) notFound();
  return { access, layout };
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { jobId, faceId } = await params;
  const { layout } = await layoutFor(jobId, faceId);
  return { title: `${layout.faceTitle}, layout table` };
}

export default async function LayoutTablePage({ params }: Props) {
  const { jobId, faceId } = await params;
  const { access, layout } = await layoutFor(jobId, faceId);
  const shop = await shopSettings(access.shopId);
  return <LayoutTable initial={layout} shop={shop} mayChange={access.role !== "assistant"} />;
}
