"use client";
/** How saving stands. */
import { useEditorState, useTableContext } from "./table-context";

export function SaveStatus() {
  const { sync } = useTableContext();
  const status = useEditorState((state) => state.sync);
  switch (status.kind) {
    case "saved":
      return <span className="text-sm text-moss">Saved</span>;
    case "saving":
      return <span className="text-sm text-pencil">Saving…</span>;
    case "conflict":
      return <span className="text-sm text-crayon">Not saved: changed in another window</span>;
    case "offline":
      return (
        <span className="text-sm text-crayon">
          Not saved: no connection.{" "}
          <button type="button" onClick={sync.retryNow} className="underline">
            Try now
          </button>
        </span>
      );
    case "refused":
      return (
        <span className="text-sm text-crayon">
          Not saved. {status.message}{" "}
          <button type="button" onClick={sync.retryNow} className="underline">
            Try again
          </button>
        </span>
      );
  }
}
