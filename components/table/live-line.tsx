"use client";
/** Says what happened: seen below the table, heard by those who hear the page. */
import { useUnits } from "@/components/shell/units";
import { announcementSentence } from "./said-sentence";
import { useEditorState, useTableContext } from "./table-context";
import { useTagOf } from "./use-tag-of";

export function LiveLine() {
  const { editor } = useTableContext();
  const announcement = useEditorState((state) => state.announcement);
  const { style } = useUnits();
  const tagOf = useTagOf();
  const refused = announcement?.kind === "refused" || announcement?.kind === "read-only";
  const hint = editor.mayChange
    ? "Drag the set on the stock side, or let a front loose."
    : "You may look at this layout but not change it.";
  return (
    <p
      role="status"
      className={`min-h-9 border-t border-rule bg-sheet px-4 py-1.5 text-sm ${refused ? "text-crayon" : "text-pencil"}`}
    >
      {announcement ? (
        // A new element each time, so that the same words are heard twice.
        <span key={announcement.number}>{announcementSentence(announcement, style, tagOf)}</span>
      ) : (
        hint
      )}
    </p>
  );
}
