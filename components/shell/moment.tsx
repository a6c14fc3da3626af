"use client";
import { useUnits } from "./units";

/** A moment in the shop's own time zone; the exact UTC time stays in the markup. */
export function Moment({ at }: { at: string }) {
  const { timeZone } = useUnits();
  const text = new Intl.DateTimeFormat("en-GB", {
    timeZone,
    day: "numeric",
    month: "short",
    hour: "2-digit",
    minute: "2-digit",
  }).format(new Date(at));
  return (
    <time dateTime={at} className="whitespace-nowrap">
      {text}
    </time>
  );
}
