"use client";
/** Freezes the layout as a cut order. Not to be pressed while anything stands in the way; says what. */
import Link from "next/link";
import { useId } from "react";
import { Button } from "@/components/ui/button";
import { messageOf } from "@/lib/client/fault-from-server";
import type { TakenBoard } from "@/lib/editor/selectors/taken-boards";
import { standsInTheWay } from "@/lib/schemas/spoken-for";
import { revisionLetter } from "@/lib/words/revision-letter";
import { takenByReason } from "@/lib/words/taken-by";
import { useEditorState, useTableContext } from "./table-context";
import type { Issuing } from "./use-issuing";
import type { Problems } from "./use-problems";

interface Props {
  issuing: Issuing;
  problems: Problems;
  taken: readonly TakenBoard[];
}

export function IssueButton({ issuing: { issue, current, outOfDate, asItStands }, problems: { found, working }, taken }: Props) {
  const { editor } = useTableContext();
  const status = useEditorState((state) => state.sync);
  const reasonId = useId();
  const inTheWay = found.filter(standsInTheWay).length;
  const reason = reasonAgainst(taken, inTheWay, working, status.kind) ?? (asItStands ? "It is issued as it stands" : null);
  return (
    <div className="flex flex-wrap items-center justify-end gap-x-3 gap-y-1">
      <p className="text-sm" role="status">
        {issue.error && <span className="text-crayon">{messageOf(issue.error)} </span>}
        {current && (
          <>
            <Link href={`/orders/${current.id}`} className="text-chalk underline">
              Cut order {current.number} {revisionLetter(current.revision)}
            </Link>{" "}
            {issue.data && !outOfDate ? "issued" : outOfDate ? "is older than this layout" : ""}
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

function reasonAgainst([first]: readonly TakenBoard[], problems: number, working: boolean, status: string): string | null {
  if (first) return takenByReason(first.tag, first.takenBy);
  if (problems > 0) return problems === 1 ? "One problem to mend first" : `${problems} problems to mend first`;
  if (status === "offline" || status === "conflict" || status === "refused") return "Not saved yet";
  return working ? "Looking it over…" : null;
}
