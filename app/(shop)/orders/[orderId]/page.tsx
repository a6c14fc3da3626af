import type { Metadata } from "next";
import { OrderPage } from "@/components/order/order-page";
import { pageAccess } from "@/lib/server/access";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { benchUrl } from "@/lib/server/orders/print";
import { readOrder } from "@/lib/server/orders/read-orders";
import { qrCode } from "@/lib/server/print/qr-code";
import { shopSettings } from "@/lib/server/shops";

export const metadata: Metadata = { title: "Cut order" };

interface Props {
  params: Promise<{ orderId: string }>;
  searchParams: Promise<{ revision?: string | string[] }>;
}

export default async function OneOrderPage({ params, searchParams }: Props) {
  const { orderId } = await params;
  const { revision: given } = await searchParams;
  const access = await pageAccess(`/orders/${orderId}`);
  const revision = typeof given === "string" && /^[1-9]\d{0,5}$/.test(given) ? Number(given) : undefined;
  const order = await orNotFound(readOrder(access.shopId, orderId, revision));
  const { paper } = await shopSettings(access.shopId);
  const url = benchUrl(orderId, order.revision);
  return <OrderPage key={order.revisionId} initial={order} revision={revision} paper={paper} qr={{ url, ...qrCode(url) }} />;
}
