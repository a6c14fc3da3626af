"use client";
import { useUnits } from "./units";

/** A moment in the shop's own time zone, with its year unless that is this one; the exact UTC time stays in the markup. */
export function Moment({ at }: { at: string }) {
  const { timeZone } = useUnits();
  const yearOf = (date: Date) => new Intl.DateTimeFormat("en-GB", { timeZone, year: "numeric" }).format(date);
  const moment = new Date(at);
  const text = new Intl.DateTimeFormat("en-GB", {
    timeZone,
    day: "numeric",
    month: "short",
    ...(yearOf(moment) !== yearOf(new Date()) && { year: "numeric" as const }),
    hour: "2-digit",
    minute: "2-digit",
  }).format(moment);
  return (
    <time dateTime={at} className="whitespace-nowrap">
      {text}
    </time>
  );
}
