"use client";
/** Freezes the layout as a cut order. Not to be pressed while anything stands in the way; says what. */
import { useMutation } from "@tanstack/react-query";
import Link from "next/link";
import { useId, useState } from "react";
import { Button } from "@/components/ui/button";
import { messageOf } from "@/lib/client/fault-from-server";
import { issueOrder } from "@/lib/client/layout";
import type { EditorState } from "@/lib/editor/editor";
import type { Layout } from "@/lib/schemas/layout";
import { standsInTheWay } from "@/lib/schemas/spoken-for";
import { revisionLetter } from "@/lib/words/revision-letter";
import { useEditorState, useTableContext } from "./table-context";
import { useFreshBoards } from "./use-fresh-boards";
import { useNamed } from "./use-named";
import type { Problems } from "./use-problems";

interface Props {
  problems: Problems;
  /** The order that was there when the page was opened, and the revision of the layout then. */
  order: Layout["order"];
  openedAt: number;
}

export function IssueButton({ problems: { found, working }, order, openedAt }: Props) {
  const { editor, sync, faceId } = useTableContext();
  const status = useEditorState((state) => state.sync);
  const document = useEditorState((state) => state.document);
  const { woodOf } = useNamed();
  const inTheWay = found.filter((problem) => standsInTheWay(problem, woodOf)).length;
  const refreshBoards = useFreshBoards();
  const reasonId = useId();
  const pictures = useEditorState(picturesUsed);
  const [openedOn] = useState(pictures);
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
    : order !== null && (order.superseded || sync.revision() !== openedAt || openedOn !== pictures);
  const reason = reasonAgainst(inTheWay, working, status.kind) ?? (current && !outOfDate ? "It is issued as it stands" : null);
  return (
    <div className="flex flex-wrap items-center justify-end gap-x-3 gap-y-1">
      <p className="text-sm" role="status">
        {issue.error && <span className="text-crayon">{messageOf(issue.error)} </span>}
        {current && (
          <>
            <Link href={`/orders/${current.id}`} className="text-chalk underline">
              Cut order {current.number} {revisionLetter(current.revision)}
            </Link>{" "}
            {issued && !outOfDate ? "issued" : outOfDate ? "is older than this layout" : ""}
          </>
        )}
      </p>
      {editor.mayChange && (
        <>
          <span id={reasonId} className="text-sm text-pencil">
            {reason}
          </span>
          <Button
            kind="primary"
            disabled={reason !== null || issue.isPending}
            aria-describedby={reasonId}
            onClick={() => issue.mutate()}
          >
            {issue.isPending ? "Issuing…" : current ? "Issue a new revision" : "Issue cut order"}
          </Button>
        </>
      )}
    </div>
  );
}

/** Which versions of which pictures the fronts lie on: moving over to another makes an order out of date as a slide does. */
function picturesUsed({ document, boards }: EditorState): string {
  const used = new Set(document.layout.groups.flatMap(({ placement }) => placement?.stockId ?? []));
  return boards.flatMap(({ face, straighteningId }) => (used.has(face.id) ? straighteningId : [])).join(" ");
}

function reasonAgainst(problems: number, working: boolean, status: string): string | null {
  if (problems > 0) return problems === 1 ? "One problem to mend first" : `${problems} problems to mend first`;
  if (status === "offline" || status === "conflict" || status === "refused") return "Not saved yet";
  return working ? "Looking it over…" : null;
}
