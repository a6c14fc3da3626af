/**
 * Autosave: one request at a time, each with the revision it started from. Changes made meanwhile go out together with the next one. Knows nothing of
 * the network: sending and waiting are handed in.
 */
import { sameBytes, type TableDocument } from "../document";
import { mergeDocuments } from "../merge";
import type { SavedElsewhere, SyncStatus } from "./status";

export interface SaveRequest {
  readonly baseRevision: number;
  readonly document: TableDocument;
}

export type SaveOutcome =
  | { readonly kind: "saved"; readonly revision: number }
  | { readonly kind: "conflict"; readonly theirs: SavedElsewhere }
  | { readonly kind: "unreachable" }
  | { readonly kind: "refused"; readonly message: string };

export interface SyncWorld {
  /** Never throws: what can go wrong is an outcome. */
  readonly save: (request: SaveRequest) => Promise<SaveOutcome>;
  /** Calls back after so many milliseconds; returns the way to call it off. */
  readonly after: (ms: number, then: () => void) => () => void;
  readonly onStatus: (status: SyncStatus) => void;
  /** What a second window saved was taken in: the table shows `document` from now on. `oursKept`: together with what was done here. */
  readonly onMerged: (document: TableDocument, updatedBy: string, oursKept: boolean) => void;
}

export interface Sync {
  /** The document as it stands now; saved soon. */
  readonly changed: (document: TableDocument) => void;
  /** After a conflict. "theirs" hands their document out through `onMerged`. */
  readonly resolve: (keep: "mine" | "theirs") => void;
  /** The connection is back, or somebody asks to try again. */
  readonly retryNow: () => void;
  /** The last revision known to be saved. */
  readonly revision: () => number;
  /** Resolves once nothing is left to save, or false when something stands in the way. */
  readonly settled: () => Promise<boolean>;
}

/** A drag or a few presses of a key are one request. */
export const SAVE_DELAY_MS = 350;
const FIRST_RETRY_MS = 2_000;
const LONGEST_RETRY_MS = 30_000;

/** How long to wait before the try after so many that failed. */
export function retryDelay(failures: number): number {
  return Math.min(LONGEST_RETRY_MS, FIRST_RETRY_MS * 2 ** Math.max(0, failures - 1));
}

export function createSync(world: SyncWorld, saved: TableDocument, revision: number): Sync {
  let base = { document: saved, revision };
  let present = saved;
  let inFlight = false;
  let failures = 0;
  let status: SyncStatus = { kind: "saved" };
  let callOff: (() => void) | null = null;
  let waiting: ((done: boolean) => void)[] = [];
  /** Sent from the present base without an answer: any of them may have been saved all the same. */
  let unanswered: TableDocument[] = [];

  const isSaving = () => status.kind === "saving";

  const show = (next: SyncStatus) => {
    status = next;
    world.onStatus(next);
    if (next.kind === "saving") return;
    const told = waiting;
    waiting = [];
    for (const tell of told) tell(next.kind === "saved");
  };

  const later = (ms: number, then: () => void) => {
    callOff?.();
    callOff = world.after(ms, () => {
      callOff = null;
      then();
    });
  };

  const send = async () => {
    if (inFlight || status.kind === "conflict") return;
    callOff?.();
    callOff = null;
    if (sameBytes(present, base.document)) return show({ kind: "saved" });
    if (status.kind !== "offline") show({ kind: "saving" });
    const sent = present;
    inFlight = true;
    const outcome = await world.save({ baseRevision: base.revision, document: sent });
    inFlight = false;
    take(outcome, sent);
  };

  const takeSaved = (sent: TableDocument, savedAs: number) => {
    base = { document: sent, revision: savedAs };
    unanswered = [];
    show({ kind: sameBytes(present, sent) ? "saved" : "saving" });
    if (isSaving()) void send();
  };

  const take = (outcome: SaveOutcome, sent: TableDocument) => {
    if (outcome.kind === "unreachable") {
      failures += 1;
      unanswered.push(sent);
      show({ kind: "offline" });
      return later(retryDelay(failures), send);
    }
    failures = 0;
    if (outcome.kind === "refused") return show({ kind: "refused", message: outcome.message });
    if (outcome.kind === "saved") return takeSaved(sent, outcome.revision);
    // What stands there may have been sent from here, its answer lost on the way: then nobody else changed anything.
    const { theirs } = outcome;
    const own = [...unanswered, sent].find((document) => sameBytes(document, theirs.document));
    return own ? takeSaved(own, theirs.revision) : takeConflict(theirs);
  };

  const takeConflict = (theirs: SavedElsewhere) => {
    const merge = mergeDocuments(base.document, present, theirs.document);
    if (!merge.ok) return show({ kind: "conflict", theirs });
    base = theirs;
    unanswered = [];
    present = merge.document;
    show({ kind: "saving" });
    world.onMerged(merge.document, theirs.updatedBy, true);
    void send();
  };

  return {
    changed(document) {
      present = document;
      if (status.kind === "conflict" || inFlight) return;
      if (status.kind === "offline") return;
      show({ kind: "saving" });
      later(SAVE_DELAY_MS, send);
    },
    resolve(keep) {
      if (status.kind !== "conflict") return;
      const { theirs } = status;
      base = theirs;
      unanswered = [];
      if (keep === "theirs") {
        present = theirs.document;
        show({ kind: "saved" });
        world.onMerged(theirs.document, theirs.updatedBy, false);
        return;
      }
      show({ kind: "saving" });
      void send();
    },
    retryNow() {
      failures = 0;
      if (status.kind === "offline" || status.kind === "refused") void send();
    },
    revision: () => base.revision,
    async settled() {
      if (isSaving() && !inFlight) void send();
      if (isSaving()) return new Promise((tell) => waiting.push(tell));
      return status.kind === "saved";
    },
  };
}
