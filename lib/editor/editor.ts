/**
 * The layout table without a screen: the document, what was done to it, what is selected and previewed, and how saving stands. Commands come in as functions
 * `(document) → outcome`; everything that listens reads one immutable state. No React, no fabric, no network.
 */
import type { BoardFace, PieceId } from "@/lib/layout";
import { pieceIdsOf } from "@/lib/layout";
import type { CommandOutcome, CommandRefusal, Said } from "./commands/outcome";
import { saidOfDrag } from "./commands/said-of-drag";
import { groupsOfPieces } from "./commands/targets";
import { applyDiff, diffBetween, isEmptyDiff } from "./diff";
import type { TableDocument } from "./document";
import { emptyHistory, type History, recorded, redone, undone } from "./history";
import { createStore, type Store } from "./store";
import type { SyncStatus } from "./sync/status";
import type { TableBoard } from "./table-board";
import type { Preview } from "./tools/drag";

/** What there is to tell. Numbered, so that the same words twice are told twice. */
export type Announcement = { readonly number: number } & (
  | { readonly kind: "did"; readonly said: Said }
  | { readonly kind: "refused"; readonly refusal: CommandRefusal }
  | { readonly kind: "undid" | "redid" | "nothing-to-undo" | "nothing-to-redo" | "drag-dropped" | "read-only" }
  | { readonly kind: "merged"; readonly updatedBy: string }
);

export interface EditorState {
  readonly document: TableDocument;
  readonly boards: readonly TableBoard[];
  /** The same boards as the core knows them; changes only when they do. */
  readonly boardFaces: readonly BoardFace[];
  readonly history: History;
  /** In the order in which they were chosen. */
  readonly selection: readonly PieceId[];
  /** A drag in progress. */
  readonly preview: Preview | null;
  readonly sync: SyncStatus;
  readonly announcement: Announcement | null;
}

export interface EditorStart {
  readonly document: TableDocument;
  readonly boards: readonly TableBoard[];
  /** False for those who may look only: every command is refused. */
  readonly mayChange: boolean;
  /** Told of every document that is to be saved. */
  readonly onChange: (document: TableDocument) => void;
  /** Milliseconds on a steady clock. */
  readonly now: () => number;
}

export interface Editor extends Pick<Store<EditorState>, "get" | "subscribe"> {
  readonly mayChange: boolean;
  /** Runs a command and records it as one step. `runKey`: see `HistoryEntry`. */
  readonly run: (command: (document: TableDocument) => CommandOutcome, runKey?: string) => boolean;
  readonly undo: () => void;
  readonly redo: () => void;
  readonly select: (pieces: readonly PieceId[]) => void;
  /** Adds the piece to what is selected, or takes it out. */
  readonly toggle: (piece: PieceId) => void;
  readonly showPreview: (preview: Preview | null) => void;
  /** Makes what the preview shows one step. */
  readonly commitPreview: () => void;
  readonly dropPreview: () => void;
  readonly setBoards: (boards: readonly TableBoard[]) => void;
  readonly setSync: (status: SyncStatus) => void;
  /** Another window's changes have come in with ours; or theirs instead of ours. Undo starts afresh when ours were given up. */
  readonly adopt: (document: TableDocument, updatedBy: string, oursKept: boolean) => void;
}

export function createEditor(start: EditorStart): Editor {
  const store = createStore<EditorState>({
    document: start.document,
    boards: start.boards,
    boardFaces: start.boards.map(({ face }) => face),
    history: emptyHistory,
    selection: [],
    preview: null,
    sync: { kind: "saved" },
    announcement: null,
  });
  const change = (part: Partial<EditorState>) => store.set({ ...store.get(), ...part });
  let told = 0;
  const tell = (announcement: Unnumbered): Announcement => {
    told += 1;
    return { ...announcement, number: told };
  };
  const announce = (announcement: Unnumbered) => change({ announcement: tell(announcement) });

  const toDocument = (document: TableDocument, history: History, announcement: Announcement) => {
    change({ document, history, announcement, preview: null, selection: stillThere(document, store.get().selection) });
    start.onChange(document);
  };

  const take = (outcome: CommandOutcome, runKey: string | null): boolean => {
    if (!start.mayChange) {
      announce({ kind: "read-only" });
      return false;
    }
    if (!outcome.ok) {
      announce({ kind: "refused", refusal: outcome.refusal });
      return false;
    }
    const { document, history } = store.get();
    const entry = { diff: outcome.diff, runKey, at: start.now() };
    toDocument(applyDiff(document, outcome.diff), recorded(history, entry), tell({ kind: "did", said: outcome.said }));
    return true;
  };

  const travel = (step: ReturnType<typeof undone>, done: "undid" | "redid", nothing: Unnumbered) => {
    if (!step) return announce(nothing);
    toDocument(applyDiff(store.get().document, step.diff), step.history, tell({ kind: done }));
  };

  return {
    get: store.get,
    subscribe: store.subscribe,
    mayChange: start.mayChange,
    run: (command, runKey) => take(command(store.get().document), runKey ?? null),
    undo: () => travel(undone(store.get().history), "undid", { kind: "nothing-to-undo" }),
    redo: () => travel(redone(store.get().history), "redid", { kind: "nothing-to-redo" }),
    select: (selection) => change({ selection: stillThere(store.get().document, selection) }),
    toggle(piece) {
      const { selection } = store.get();
      change({ selection: selection.includes(piece) ? selection.filter((id) => id !== piece) : [...selection, piece] });
    },
    showPreview: (preview) => change({ preview }),
    commitPreview() {
      const { preview, document } = store.get();
      if (preview === null) return;
      const diff = diffBetween(document, { ...document, layout: preview.layout });
      if (isEmptyDiff(diff)) return change({ preview: null });
      take({ ok: true, diff, said: saidOfDrag(document, preview) }, null);
    },
    dropPreview() {
      if (store.get().preview !== null) change({ preview: null, announcement: tell({ kind: "drag-dropped" }) });
    },
    setBoards: (boards) => change({ boards, boardFaces: boards.map(({ face }) => face) }),
    setSync: (sync) => change({ sync }),
    adopt(document, updatedBy, oursKept) {
      const history = oursKept ? store.get().history : emptyHistory;
      change({
        document,
        history,
        preview: null,
        selection: stillThere(document, store.get().selection),
        announcement: tell({ kind: "merged", updatedBy }),
      });
    },
  };
}

type WithoutNumber<Told> = Told extends unknown ? Omit<Told, "number"> : never;
type Unnumbered = WithoutNumber<Announcement>;

/** The groups that a command acts on: those of the selected pieces, or the set where nothing is selected. */
export function groupsInHand({ document, selection }: Pick<EditorState, "document" | "selection">): string[] {
  const [set] = document.layout.groups;
  if (selection.length > 0 || set === undefined) return groupsOfPieces(document.layout, selection);
  return [set.id];
}

/** The layout as it is shown now: with the drag in progress. */
export function shownLayout({ document, preview }: Pick<EditorState, "document" | "preview">): TableDocument["layout"] {
  return preview?.layout ?? document.layout;
}

function stillThere(document: TableDocument, selection: readonly PieceId[]): readonly PieceId[] {
  const present = new Set(pieceIdsOf(document.layout.face));
  return selection.every((id) => present.has(id)) ? selection : selection.filter((id) => present.has(id));
}
