/** What the user sees of autosave. */
import type { TableDocument } from "../document";

export interface SavedElsewhere {
  readonly revision: number;
  readonly updatedBy: string;
  readonly document: TableDocument;
}

export type SyncStatus =
  | { readonly kind: "saved" }
  | { readonly kind: "saving" }
  /** The server cannot be reached; tried again by itself. */
  | { readonly kind: "offline" }
  /** Another window saved changes to the same pieces or settings: somebody has to choose. */
  | { readonly kind: "conflict"; readonly theirs: SavedElsewhere }
  /** The server would not take it, and will not by being asked again. */
  | { readonly kind: "refused"; readonly message: string };

/** Whether leaving the page now would lose work. */
export function hasUnsavedWork(status: SyncStatus): boolean {
  return status.kind !== "saved";
}

/** Whether the work cannot be saved without something happening first: a connection, a choice, another change. */
export function isStuck(status: SyncStatus): boolean {
  return status.kind !== "saved" && status.kind !== "saving";
}
