"use client";
import Link from "next/link";
import { useState } from "react";
import { Moment } from "@/components/shell/moment";
import { Button } from "@/components/ui/button";
import type { HistoryRow } from "@/lib/schemas/history";
import { type HistoryLine, historyLines, historyWords } from "@/lib/words/history-line";

/** As many as stand beside the orders and jobs of a usual day. */
const shownAtFirst = 12;

/** What was done in the shop, newest first; the rest at a click. */
export function Lately({ rows }: { rows: readonly HistoryRow[] }) {
  const [all, setAll] = useState(false);
  const lines = historyLines(rows);
  if (lines.length === 0) return <p className="text-pencil">Nothing yet. What people in the shop do is listed here.</p>;
  return (
    <>
      <ol className="divide-y divide-rule">
        {lines.slice(0, all ? undefined : shownAtFirst).map((line) => (
          <Line key={line.row.id} {...line} />
        ))}
      </ol>
      {!all && lines.length > shownAtFirst && (
        <Button size="small" className="mt-2" onClick={() => setAll(true)}>
          Show earlier
        </Button>
      )}
    </>
  );
}

function Line({ row, times }: HistoryLine) {
  const { by, before, after } = historyWords(row);
  return (
    <li className="flex flex-wrap items-baseline gap-x-2 py-2.5 text-sm">
      {by !== null && <span className="font-semibold">{by}</span>}
      {before && <span>{before}</span>}
      {row.label !== null && row.path !== null && (
        <Link href={row.path} className="text-chalk underline-offset-4 hover:underline">
          {row.label}
        </Link>
      )}
      {after && <span>{after}</span>}
      {times > 1 && <span className="text-pencil">{times} times</span>}
      <span className="measure ml-auto text-pencil">
        <Moment at={row.at} />
      </span>
    </li>
  );
}
