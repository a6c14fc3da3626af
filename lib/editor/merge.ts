/**
 * Brings together what two windows made of one saved document. When the two touched different pieces and settings both are kept; otherwise
 * somebody has to choose.
 */
import { layoutFaults } from "@/lib/layout";
import { applyDiff, diffBetween, touchedBy } from "./diff";
import { sameBytes, type TableDocument } from "./document";

export type Merge =
  | { readonly ok: true; readonly document: TableDocument }
  /** Both changed these: piece ids and names of settings, sorted. */
  | { readonly ok: false; readonly both: readonly string[] };

/** `base` is what both started from. Symmetric in content: merging mine into theirs keeps the same changes as theirs into mine. */
export function mergeDocuments(base: TableDocument, mine: TableDocument, theirs: TableDocument): Merge {
  if (sameBytes(mine, theirs)) return { ok: true, document: theirs };
  const ours = diffBetween(base, mine);
  const touchedByThem = touchedBy(diffBetween(base, theirs));
  const both = [...touchedBy(ours)].filter((name) => touchedByThem.has(name)).sort();
  if (both.length > 0) return { ok: false, both };
  const document = applyDiff(theirs, ours);
  // Other sizes from one side and a swap from the other touch different parts and still contradict each other.
  return layoutFaults(document.layout).length === 0 ? { ok: true, document } : { ok: false, both: [...touchedBy(ours)].sort() };
}
