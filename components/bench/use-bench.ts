"use client";
/** The state of one bench: which step is in hand, what is ticked, and ticking. A tick counts once the server has it on disk. */
import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useMemo, useState } from "react";
import { orderKeys, progressQuery, tickStep, untickStep } from "@/lib/client/order";
import type { Order, OrderProgress } from "@/lib/schemas/order";
import { orderSteps } from "@/lib/schemas/order-steps";

export function useBench(order: Order) {
  const client = useQueryClient();
  const { id: orderId, revisionId } = order;
  const steps = useMemo(() => orderSteps(order.snapshot), [order.snapshot]);
  const progress = useQuery({ ...progressQuery(orderId, revisionId), initialData: progressOf(order) });
  const ticks = useMemo(() => new Map(progress.data.ticks.map((tick) => [tick.stepId, tick])), [progress.data.ticks]);
  const [at, setAt] = useState(() => firstOpen(steps.map(({ id }) => ticks.has(id))));

  const key = orderKeys.progress(orderId, revisionId);
  const change = useMutation({
    mutationFn: ({ stepId, done }: { stepId: string; done: boolean }) =>
      (done ? tickStep : untickStep)({ orderId, revisionId, stepId }),
    // An answer to an older question must not take the new tick away again.
    onMutate: () => client.cancelQueries({ queryKey: key }),
    onSuccess: ({ ticks: now }) =>
      client.setQueryData(key, (before: OrderProgress | undefined) => ({ ...(before ?? progress.data), ticks: now })),
    // It may be refused because the revision was superseded a moment ago: ask at once.
    onError: () => client.invalidateQueries({ queryKey: key }),
  });

  return {
    steps,
    ticks,
    at,
    step: steps[at],
    asCut: progress.data.asCut,
    superseded: progress.data.superseded,
    newestRevision: progress.data.newestRevision,
    /** Set while what others do cannot be seen. */
    connectionError: progress.error,
    pending: change.isPending,
    error: change.error,
    show: (place: number) => {
      change.reset();
      setAt(Math.max(0, Math.min(place, steps.length - 1)));
    },
    /** Ticks the step in hand and takes up the next one that is open. */
    finishStep: () => {
      const step = steps[at];
      if (step) change.mutate({ stepId: step.id, done: true }, { onSuccess: ({ ticks: now }) => setAt(nextOpen(now, at)) });
    },
    untick: (stepId: string) => change.mutate({ stepId, done: false }),
  };

  function nextOpen(now: OrderProgress["ticks"], after: number): number {
    const ticked = new Set(now.map(({ stepId }) => stepId));
    const next = steps.findIndex(({ id }, place) => place > after && !ticked.has(id));
    return next >= 0
      ? next
      : firstOpen(
          steps.map(({ id }) => ticked.has(id)),
          after,
        );
  }
}

export type BenchState = ReturnType<typeof useBench>;

function progressOf({ ticks, asCut, superseded, revisions, revision }: Order): OrderProgress {
  return { ticks, asCut, superseded, newestRevision: revisions[0]?.revision ?? revision };
}

function firstOpen(done: readonly boolean[], otherwise = done.length - 1): number {
  const open = done.indexOf(false);
  return open >= 0 ? open : Math.max(0, otherwise);
}
