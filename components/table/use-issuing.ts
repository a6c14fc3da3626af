"use client";
/** Issuing the layout, and how the order that its face has stands to it. */
import { useMutation } from "@tanstack/react-query";
import { useState } from "react";
import { issueOrder } from "@/lib/client/layout";
import type { EditorState } from "@/lib/editor/editor";
import type { Layout } from "@/lib/schemas/layout";
import { useEditorState, useTableContext } from "./table-context";
import { useFreshBoards } from "./use-fresh-boards";

export type Issuing = ReturnType<typeof useIssuing>;

/** `order`: the one that was there when the page was opened; `revision`: of the layout then. */
export function useIssuing({ order, revision }: Pick<Layout, "order" | "revision">) {
  const { editor, sync, faceId } = useTableContext();
  const document = useEditorState((state) => state.document);
  const pictures = useEditorState(picturesUsed);
  const [openedOn] = useState(pictures);
  // Once a change is saved, nothing tells so but this and `sync.revision()`.
  useEditorState((state) => state.sync);
  const refreshBoards = useFreshBoards();
  const issue = useMutation({
    mutationFn: async () => {
      if (!(await sync.settled())) throw new Error("The layout is not saved yet.");
      const issued = await issueOrder(faceId, sync.revision());
      return { ...issued, document: editor.get().document, pictures: picturesUsed(editor.get()) };
    },
    // It may have been refused for what another face was given meanwhile.
    onError: refreshBoards,
  });
  const issued = issue.data;
  const current = issued ?? order;
  const outOfDate = issued
    ? issued.document !== document || issued.pictures !== pictures
    : order !== null && (order.superseded || sync.revision() !== revision || openedOn !== pictures);
  return {
    issue,
    /** The order, unless none was issued yet. */
    current,
    outOfDate,
    /** The order holds for the layout as it lies. */
    asItStands: current !== null && !outOfDate,
  };
}

/** Which versions of which pictures the fronts lie on: moving over to another makes an order out of date as a slide does. */
function picturesUsed({ document, boards }: EditorState): string {
  const used = new Set(document.layout.groups.flatMap(({ placement }) => placement?.stockId ?? []));
  return boards.flatMap(({ face, straighteningId }) => (used.has(face.id) ? straighteningId : [])).join(" ");
}
