/**
 * What the layout table edits, undoes and saves: the layout and the saws its losses were taken from. Plain immutable JSON. The boards stand
 * beside it (`table-board.ts`): they are put on the table and taken off by requests of their own and are no part of undo.
 */
import type { FaceLayout } from "@/lib/layout";
import type { Layout } from "@/lib/schemas/layout";

export interface TableDocument {
  readonly layout: FaceLayout;
  /** The saws that `layout.crosscut` and `layout.rip` were taken from; null where typed in by hand. */
  readonly crosscutSawId: string | null;
  readonly ripSawId: string | null;
}

/** The document of a layout as the server answers with it. */
export function documentOf({
  document,
  crosscutSawId,
  ripSawId,
}: Pick<Layout, "document" | "crosscutSawId" | "ripSawId">): TableDocument {
  return { layout: document, crosscutSawId, ripSawId };
}

/** Whether two values of a document would be saved as the same bytes. */
export function sameBytes(a: unknown, b: unknown): boolean {
  return a === b || JSON.stringify(a) === JSON.stringify(b);
}
