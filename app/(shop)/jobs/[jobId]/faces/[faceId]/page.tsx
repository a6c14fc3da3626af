import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { LayoutTable } from "@/components/table/layout-table";
import { pageAccess } from "@/lib/server/access";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { shopSettings } from "@/lib/server/shops";

export const metadata: Metadata = { title: "Layout table" };

export default async function LayoutTablePage({ params }: { params: Promise<{ jobId: string; faceId: string }> }) {
  const { jobId, faceId } = await params;
  const access = await pageAccess(`/jobs/${jobId}/faces/${faceId}`);
  const [layout, shop] = await Promise.all([orNotFound(readLayout(access, faceId)), shopSettings(access.shopId)]);
  if (layout.jobId !== jobId) notFound();
  return <LayoutTable initial={layout} shop={shop} mayChange={access.role !== "assistant"} />;
}
