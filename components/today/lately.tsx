import Link from "next/link";
import { Moment } from "@/components/shell/moment";
import type { HistoryRow } from "@/lib/schemas/history";
import { historyLines, historyWords } from "@/lib/words/history-line";

/** What was done in the shop, newest first. */
export function Lately({ rows }: { rows: readonly HistoryRow[] }) {
  return (
    <ol className="divide-y divide-rule">
      {historyLines(rows).map(({ row, times }) => (
        <li key={row.id} className="flex flex-wrap items-baseline gap-x-2 py-2.5 text-sm">
          <span className="font-semibold">{row.by ?? "The system"}</span>
          <span>{historyWords(row)}</span>
          {row.label !== null && row.path !== null && (
            <Link href={row.path} className="text-chalk underline-offset-4 hover:underline">
              {row.label}
            </Link>
          )}
          {times > 1 && <span className="text-pencil">{times} times</span>}
          <span className="measure ml-auto text-pencil">
            <Moment at={row.at} />
          </span>
        </li>
      ))}
    </ol>
  );
}
