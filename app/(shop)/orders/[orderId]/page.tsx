import type { Metadata } from "next";
import { cache } from "react";
import { OrderPage } from "@/components/order/order-page";
import { issueRest } from "@/lib/schemas/rest";
import { pageAccess } from "@/lib/server/access";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { benchUrl } from "@/lib/server/orders/print";
import { readOrder } from "@/lib/server/orders/read-orders";
import { qrCode } from "@/lib/server/print/qr-code";
import { shopSettings } from "@/lib/server/shops";
import { revisionLetter } from "@/lib/words/revision-letter";

interface Props {
  params: Promise<{ orderId: string }>;
  searchParams: Promise<{ revision?: string | string[] }>;
}

const orderFor = cache(async (orderId: string, revision: number | undefined) => {
  const access = await pageAccess(`/orders/${orderId}`);
  return { access, order: await orNotFound(readOrder(access.shopId, orderId, revision)) };
});

const revisionOf = (given: string | string[] | undefined): number | undefined =>
  typeof given === "string" && /^[1-9]\d{0,5}$/.test(given) ? Number(given) : undefined;

export async function generateMetadata({ params, searchParams }: Props): Promise<Metadata> {
  const { order } = await orderFor((await params).orderId, revisionOf((await searchParams).revision));
  return { title: `Cut order ${order.number} ${revisionLetter(order.revision)}` };
}

export default async function OneOrderPage({ params, searchParams }: Props) {
  const { orderId } = await params;
  const revision = revisionOf((await searchParams).revision);
  const { access, order } = await orderFor(orderId, revision);
  const { paper } = await shopSettings(access.shopId);
  const url = benchUrl(orderId, order.revision);
  const mayIssue = issueRest.access.some((role) => role === access.role);
  return (
    <OrderPage
      key={order.revisionId}
      initial={order}
      revision={revision}
      paper={paper}
      qr={{ url, ...qrCode(url) }}
      mayIssue={mayIssue}
    />
  );
}
