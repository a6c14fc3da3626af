"use client";
import { useUnits } from "../shell/units";

/** A day in the shop's zone. */
export function ShopDate({ at }: { at: string }) {
  const { timeZone } = useUnits();
  const format = new Intl.DateTimeFormat("en-GB", { timeZone, day: "numeric", month: "short", year: "numeric" });
  return <time dateTime={at}>{format.format(new Date(at))}</time>;
}
