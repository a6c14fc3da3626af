/** What happened, as a line to read: "entered", "ticked step 4 of". Saves of a layout that follow one another count as one. */
import type { HistoryRow } from "@/lib/schemas/history";

/** Verb and noun as history rows hold them, with the words that stand before the name of the thing. */
const sayings: Readonly<Record<string, string>> = {
  "board entered": "entered board",
  "board changed": "changed board",
  "board marked": "marked a photograph of",
  "board straightened": "got to scale the picture of",
  "board straightening failed": "could not get to scale the picture of",
  "board straightening cancelled": "stopped straightening the picture of",
  "board areas drawn": "drew areas on",
  "board moisture read": "read the moisture of",
  "photo taken in": "took in the photograph",
  "photo removed": "removed a photograph",
  "job opened": "opened the job",
  "job changed": "changed the job",
  "face added": "added the face",
  "face renamed": "renamed the face",
  "face removed": "removed a face",
  "layout saved": "worked on",
  "layout board put on": "put a board on the table of",
  "layout board taken off": "took a board off the table of",
  "layout moved to version": "moved to a newer picture",
  "order issued": "issued",
  "order superseded": "made out of date",
  "order ticked": "ticked a step of",
  "order unticked": "took back a tick of",
  "saw added": "added the saw",
  "saw changed": "changed the saw",
  "shop changed": "changed the settings",
};

export function historyWords({ noun, verb }: Pick<HistoryRow, "noun" | "verb">): string {
  return sayings[`${noun} ${verb}`] ?? `${verb} ${noun}`;
}

export interface HistoryLine {
  readonly row: HistoryRow;
  /** How many rows in a row this line stands for. */
  readonly times: number;
}

/** Rows newest first; the same person doing the same thing to the same thing again and again becomes one line. */
export function historyLines(rows: readonly HistoryRow[]): HistoryLine[] {
  const lines: { row: HistoryRow; times: number }[] = [];
  for (const row of rows) {
    const last = lines.at(-1);
    const again = last && last.row.by === row.by && last.row.nounId === row.nounId && last.row.verb === row.verb;
    if (again) last.times += 1;
    else lines.push({ row, times: 1 });
  }
  return lines;
}
