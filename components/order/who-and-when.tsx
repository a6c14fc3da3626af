"use client";
import type { Order } from "@/lib/schemas/order";
import { useUnits } from "../shell/units";

/** "Asha Noor, 14 Mar, 09:42" in the shop's zone. */
export function WhoAndWhen({ tick }: { tick: Pick<Order["ticks"][number], "by" | "at"> }) {
  const { timeZone } = useUnits();
  const when = new Intl.DateTimeFormat("en-GB", { timeZone, day: "numeric", month: "short", hour: "2-digit", minute: "2-digit" });
  return (
    <>
      {tick.by}, <time dateTime={tick.at}>{when.format(new Date(tick.at))}</time>
    </>
  );
}
