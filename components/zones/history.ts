/** Undo and redo over whole documents. Pure. */

export interface History<Doc> {
  readonly past: readonly Doc[];
  readonly now: Doc;
  readonly future: readonly Doc[];
  /** What made `now`; the same again is one step with it. */
  readonly key: string | null;
}

/** As far as undo goes back. */
const MOST_STEPS = 200;

export const startHistory = <Doc>(now: Doc): History<Doc> => ({ past: [], now, future: [], key: null });

/** `key`: steps in a row with the same key are undone as one, such as many presses of an arrow; null stands alone. */
export function commit<Doc>(history: History<Doc>, now: Doc, key: string | null = null): History<Doc> {
  if (now === history.now) return history;
  if (key !== null && key === history.key) return { ...history, now, future: [] };
  return { past: [...history.past, history.now].slice(-MOST_STEPS), now, future: [], key };
}

export function undo<Doc>({ past, now, future }: History<Doc>): History<Doc> {
  const before = past.at(-1);
  if (before === undefined) return { past, now, future, key: null };
  return { past: past.slice(0, -1), now: before, future: [now, ...future], key: null };
}

export function redo<Doc>({ past, now, future }: History<Doc>): History<Doc> {
  const [after, ...rest] = future;
  if (after === undefined) return { past, now, future, key: null };
  return { past: [...past, now], now: after, future: rest, key: null };
}
