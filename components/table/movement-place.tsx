"use client";
import Link from "next/link";
import { useUnits } from "@/components/shell/units";
import { climateText } from "@/lib/words/movement";
import { useTableContext } from "./table-context";
import type { Movement } from "./use-movement";

/** Where the furniture will live, and where to change that. */
export function MovementPlace({ movement: { facts } }: { movement: Movement }) {
  const { jobId } = useTableContext();
  const { style } = useUnits();
  const own = facts.climateOf === "job";
  return (
    <p className="text-sm">
      <span className="font-semibold">Where it will live: </span>
      {climateText(facts.climate, style)}.{" "}
      <Link href={`/jobs/${jobId}#place`} className="text-chalk underline">
        {own ? "Set for this job" : "As for the shop"}
      </Link>
    </p>
  );
}
