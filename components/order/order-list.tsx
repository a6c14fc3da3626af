"use client";
/** Every cut order with where it stands, the newest first. */
import { useQuery } from "@tanstack/react-query";
import Link from "next/link";
import { useState } from "react";
import { messageOf } from "@/lib/client/fault-from-server";
import { ordersQuery } from "@/lib/client/order";
import type { OrderRow } from "@/lib/schemas/order";
import { revisionLetter } from "@/lib/words/revision-letter";
import { Button } from "../ui/button";
import { Empty } from "../ui/empty";
import { Notice } from "../ui/notice";
import { PageTitle } from "../ui/page-title";
import { Pager } from "../ui/pager";
import { OrderState } from "./order-state";
import { ShopDate } from "./shop-date";

const states = [
  ["all", "All"],
  ["issued", "At the bench"],
  ["cut", "Cut"],
] as const;

export function OrderList() {
  const [state, setState] = useState<(typeof states)[number][0]>("all");
  const [page, setPage] = useState(1);
  const { data, error } = useQuery(ordersQuery({ state, page }));
  return (
    <>
      <PageTitle title="Cut orders">
        {states.map(([value, name]) => (
          <Button
            key={value}
            kind={value === state ? "primary" : "plain"}
            aria-pressed={value === state}
            onClick={() => {
              setState(value);
              setPage(1);
            }}
          >
            {name}
          </Button>
        ))}
      </PageTitle>
      <div className="px-4 md:px-5">
        {error && (
          <div className="py-4">
            <Notice kind="stop">{messageOf(error)}</Notice>
          </div>
        )}
        {data?.total === 0 && state === "all" && (
          <Empty title="No cut orders yet">
            A cut order is what the bench works from. Lay a face out on a board, then issue it from the layout table.
          </Empty>
        )}
        {data?.total === 0 && state !== "all" && <p className="py-8 text-pencil">No cut order is in this state.</p>}
        {data && data.total > 0 && (
          <ul className="mt-4 border-t border-rule">
            {data.items.map((order) => (
              <OrderLine key={order.id} order={order} />
            ))}
          </ul>
        )}
        {data && <Pager page={data.page} pageSize={data.pageSize} total={data.total} onPage={setPage} />}
      </div>
    </>
  );
}

function OrderLine({ order }: { order: OrderRow }) {
  return (
    <li className="relative grid grid-cols-[auto_1fr] items-center gap-x-4 gap-y-1 border-b border-rule py-3 hover:bg-sheet md:grid-cols-[5rem_minmax(0,1fr)_10rem_minmax(11rem,16rem)] md:px-2">
      <span className="measure text-xl">
        {order.number} {revisionLetter(order.revision)}
      </span>
      <span className="min-w-0">
        <Link href={`/orders/${order.id}`} className="font-semibold break-words after:absolute after:inset-0">
          {order.jobTitle}
        </Link>
        <span className="block text-sm text-pencil">
          {order.faceTitles.join(", ")} from {order.boards.join(", ")}
        </span>
      </span>
      <span className="col-span-2 text-sm text-pencil md:col-span-1">
        <ShopDate at={order.issuedAt} />, {order.issuedBy}
      </span>
      <span className="col-span-2 md:col-span-1">
        <OrderState order={order} />
      </span>
    </li>
  );
}
