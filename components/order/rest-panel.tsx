"use client";
/** What the bench entered, what the rest looks like around what is cut, and issuing it. */
import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { issueRest, restQuery } from "@/lib/client/as-cut";
import { messageOf } from "@/lib/client/fault-from-server";
import { orderKeys } from "@/lib/client/order";
import type { RescueKind } from "@/lib/layout";
import type { Order, OrderProgress } from "@/lib/schemas/order";
import type { RescueChoicesByBoard, Rest } from "@/lib/schemas/rest";
import { asCutWords } from "@/lib/words/as-cut";
import { styleOf } from "@/lib/words/order-step";
import { labelRanges } from "@/lib/words/part-name";
import { revisionLetter } from "@/lib/words/revision-letter";
import { Button } from "../ui/button";
import { Notice } from "../ui/notice";
import { RestBoardView } from "./rest-board-view";
import { WhoAndWhen } from "./who-and-when";

interface Props {
  order: Order;
  progress: Pick<OrderProgress, "ticks" | "asCut" | "superseded">;
  /** The owner and makers; the assistant only sees what was entered. */
  mayIssue: boolean;
}

export function RestPanel({ order, progress, mayIssue }: Props) {
  const style = styleOf(order.snapshot);
  return (
    <section aria-label="The rest" className="flex flex-col gap-3 rounded-md border border-line bg-sheet p-4">
      <h2 className="text-xl">{progress.asCut.length > 0 ? "As cut" : "Begun, and changed since"}</h2>
      {progress.asCut.length > 0 && (
        <ul className="border-t border-rule">
          {progress.asCut.map((one) => (
            <li key={one.id} className="border-b border-rule py-1.5">
              {asCutWords(one.entry, order.snapshot, style)}
              <span className="block text-sm text-pencil">
                <WhoAndWhen tick={one} />
              </span>
            </li>
          ))}
        </ul>
      )}
      {mayIssue ? <RestToIssue order={order} progress={progress} /> : <p>The maker issues the rest around what is cut.</p>}
    </section>
  );
}

function RestToIssue({ order, progress }: Omit<Props, "mayIssue">) {
  const router = useRouter();
  const client = useQueryClient();
  const [choices, setChoices] = useState<RescueChoicesByBoard>({});
  // Asked anew whenever something was ticked, entered or taken back.
  const basis = JSON.stringify([
    order.revisionId,
    progress.superseded,
    progress.ticks.map(({ stepId }) => stepId).sort(),
    progress.asCut.map(({ id, version }) => [id, version]),
  ]);
  const { data: rest, error, isFetching, refetch } = useQuery(restQuery(order.id, choices, basis));
  const issue = useMutation({
    mutationFn: (planned: Rest) => issueRest(order.id, planned.basis, choices),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: orderKeys.all });
      router.push(`/orders/${order.id}`);
      router.refresh();
    },
    // Somebody ticked or entered something meanwhile: show the rest as it is now.
    onError: () => refetch(),
  });
  const choose = (boardId: string, key: string, kind: RescueKind) =>
    setChoices((now) => ({ ...now, [boardId]: { ...now[boardId], [key]: kind } }));
  if (error) {
    return (
      <>
        <Notice kind="stop">{messageOf(error)}</Notice>
        <Button className="self-start" onClick={() => refetch()}>
          Try again
        </Button>
      </>
    );
  }
  if (!rest) return <p role="status">Working out the rest around what is cut…</p>;
  return (
    <>
      {rest.layoutChanged && (
        <Notice kind="care">
          The layout was changed after this revision was issued: fronts that are not cut yet count as they lie there now.
        </Notice>
      )}
      {rest.boards.map((board) => (
        <RestBoardView
          key={board.boardId}
          order={order}
          board={board}
          onChoose={(key, kind) => choose(board.boardId, key, kind)}
        />
      ))}
      {rest.unplaced.length > 0 && (
        <Notice kind="care">
          On no board: {rest.unplaced.length > 1 ? "fronts" : "front"} {labelRanges(rest.unplaced.map(({ label }) => label))}. Lay
          {rest.unplaced.length > 1 ? " them" : " it"} on a board at the layout table, then issue the rest from here again.
        </Notice>
      )}
      {issue.error && <Notice kind="stop">{messageOf(issue.error)}</Notice>}
      <div className="flex flex-wrap items-center gap-3">
        <Button kind="primary" disabled={issue.isPending || isFetching} onClick={() => issue.mutate(rest)}>
          {issue.isPending ? "Issuing…" : isFetching ? "Working it out…" : "Issue the rest"}
        </Button>
        <p className="text-sm text-pencil">
          As revision {revisionLetter(rest.revision + 1)}. What is ticked stays ticked, and the bench goes on with it.
        </p>
      </div>
    </>
  );
}
