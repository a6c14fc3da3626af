import type { Metadata } from "next";
import { Bench } from "@/components/bench/bench";
import { pageAccess } from "@/lib/server/access";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readOrder } from "@/lib/server/orders/read-orders";

export const metadata: Metadata = { title: "Bench" };

interface Props {
  params: Promise<{ orderId: string }>;
  searchParams: Promise<{ revision?: string | string[] }>;
}

export default async function BenchPage({ params, searchParams }: Props) {
  const { orderId } = await params;
  const { revision } = await searchParams;
  const access = await pageAccess(`/bench/${orderId}`);
  const order = await orNotFound(readOrder(access.shopId, orderId, revisionOf(revision)));
  return <Bench key={order.revisionId} order={order} />;
}

/** From the code on a sheet of paper; anything that is no number means the newest. */
function revisionOf(given: string | string[] | undefined): number | undefined {
  return typeof given === "string" && /^[1-9]\d{0,5}$/.test(given) ? Number(given) : undefined;
}
