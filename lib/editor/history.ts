/** Undo and redo over diffs. Holds no document: whoever applies a diff owns that. */
import { combined, type Diff, inverted } from "./diff";

export interface HistoryEntry {
  readonly diff: Diff;
  /** Steps with one key that follow closely are undone as one: a held arrow key. null: a step of its own. */
  readonly runKey: string | null;
  /** Milliseconds on any steady clock. */
  readonly at: number;
}

export interface History {
  readonly past: readonly HistoryEntry[];
  readonly future: readonly HistoryEntry[];
}

export const emptyHistory: History = { past: [], future: [] };

/** More steps than anyone goes back; keeps the page from growing all day. */
export const MOST_STEPS = 500;

/** Key repeats come every 30 ms; a deliberate second press rarely comes within this. */
export const RUN_GAP_MS = 700;

/** The history after one more step. What was undone before is given up. */
export function recorded(history: History, entry: HistoryEntry): History {
  const last = history.past.at(-1);
  const continues = last && entry.runKey !== null && last.runKey === entry.runKey && entry.at - last.at <= RUN_GAP_MS;
  if (last && continues && history.future.length === 0) {
    return { past: [...history.past.slice(0, -1), { ...entry, diff: combined(last.diff, entry.diff) }], future: [] };
  }
  return { past: [...history.past, entry].slice(-MOST_STEPS), future: [] };
}

export interface HistoryStep {
  readonly history: History;
  /** To be applied to the document. */
  readonly diff: Diff;
}

/** One step back, or null when there is none. */
export function undone(history: History): HistoryStep | null {
  const last = history.past.at(-1);
  if (!last) return null;
  return { history: { past: history.past.slice(0, -1), future: [last, ...history.future] }, diff: inverted(last.diff) };
}

/** One undone step forth again, or null when there is none. */
export function redone(history: History): HistoryStep | null {
  const [next, ...rest] = history.future;
  if (!next) return null;
  // A step that was undone and done again is finished: later presses do not run on into it.
  return { history: { past: [...history.past, { ...next, runKey: null }], future: rest }, diff: next.diff };
}
