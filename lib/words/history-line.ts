/** What happened, as a line to read: "entered", "ticked step 4 of". Saves of a layout that follow one another count as one. */
import type { HistoryRow } from "@/lib/schemas/history";

/** Verb and noun as history rows hold them, with the words that stand before the name of the thing. */
const sayings: Readonly<Record<string, string>> = {
  "board entered": "entered board",
  "board changed": "changed board",
  "board marked": "marked a photograph of",
  "board straightened": "straightened the picture of",
  "board straightening failed": "could not straighten the picture of",
  "board straightening cancelled": "stopped straightening the picture of",
  "board areas drawn": "drew areas on",
  "board planned": "planned the blank",
  "board put in blank": "put into a blank board",
  "board composed": "composed the picture of",
  "board taken apart": "took apart the blank",
  "board out of blank": "took out of a blank board",
  "board moisture read": "read the moisture of",
  "photo taken in": "took in the photograph",
  "photo removed": "removed a photograph",
  "job opened": "opened the job",
  "job changed": "changed the job",
  "face added": "added the face",
  "face renamed": "renamed the face",
  "face removed": "removed a face",
  "face movement chosen": "chose what stands round the fronts of",
  "layout saved": "worked on",
  "layout followed the cutting": "moved what was left to cut of",
  "layout board put on": "put a board on the table of",
  "layout board taken off": "took a board off the table of",
  "layout moved to version": "moved to a newer picture",
  "order issued": "issued",
  "order rest issued": "issued the rest of",
  "order as-cut entered": "entered what was cut of",
  "order as-cut corrected": "corrected what was cut of",
  "order as-cut taken back": "took back an entry of",
  "order ticked": "ticked a step of",
  "order unticked": "took back a tick of",
  "saw added": "added the saw",
  "saw changed": "changed the saw",
  "species added": "added the species",
  "species changed": "changed the species",
  "species removed": "removed a species",
  "shop changed": "changed the settings",
  "shop movement changed": "changed the movement settings",
};

/** The words around the name of the thing. */
export interface HistoryWords {
  /** Who begins the line; null where the thing itself does. */
  readonly by: string | null;
  readonly before: string;
  readonly after: string;
}

type Row = Pick<HistoryRow, "noun" | "verb" | "by" | "detail">;

export function historyWords({ noun, verb, by, detail }: Row): HistoryWords {
  if (noun === "order" && verb === "superseded") {
    return { by: null, before: "", after: `was superseded: ${supersededBy(by, detail.reason)}` };
  }
  return { by: by ?? "The system", before: sayings[`${noun} ${verb}`] ?? `${verb} ${noun}`, after: "" };
}

/** What people do that makes an issued order out of date, as it stands in history rows. */
const reasons = {
  "layout changed": "changed the layout",
  "picture changed": "moved the layout to another picture",
  "areas drawn": "changed what is marked on its board",
  "issued again": "issued the layout again",
  "rest issued": "issued the rest around what is cut",
} as const;
export type SupersedeReason = keyof typeof reasons;

const isReason = (value: unknown): value is SupersedeReason => typeof value === "string" && Object.hasOwn(reasons, value);

/** Rows of earlier versions tell neither who nor what. */
function supersededBy(by: string | null, reason: unknown): string {
  return by !== null && isReason(reason) ? `${by} ${reasons[reason]}` : "the layout was changed";
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
