import { Moment } from "@/components/shell/moment";
import type { HistoryRow } from "@/lib/schemas/history";
import { historyLines } from "@/lib/words/history-line";
import { boardEventWords } from "./board-event-words";

/** What was done with this board, newest first. */
export function BoardStory({ rows }: { rows: readonly HistoryRow[] }) {
  return (
    <ol className="divide-y divide-rule text-sm">
      {historyLines(rows).map(({ row, times }) => (
        <li key={row.id} className="flex flex-wrap items-baseline gap-x-3 py-1.5">
          <span>{boardEventWords(row)}</span>
          {times > 1 && <span className="text-pencil">{times} times</span>}
          <span className="ml-auto text-pencil">
            {row.by ?? "the system"}, <Moment at={row.at} />
          </span>
        </li>
      ))}
    </ol>
  );
}
