import type { Metadata } from "next";
import { OrderList } from "@/components/order/order-list";

export const metadata: Metadata = { title: "Cut orders" };

export default function OrdersPage() {
  return <OrderList />;
}
