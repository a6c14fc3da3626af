"use client";
/** What was entered of the order in hand, what it comes to, and entering more. An entry counts once the server has it on disk. */
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useMemo } from "react";
import { enterAsCut, removeAsCut } from "@/lib/client/as-cut";
import { orderKeys, tickStep } from "@/lib/client/order";
import { type AsCut, type AsCutEntry, asCutSubject } from "@/lib/schemas/as-cut";
import type { Order, OrderProgress } from "@/lib/schemas/order";
import { restEffect } from "@/lib/words/rest-effect";
import type { BenchState } from "./use-bench";

/** What a sheet saves at once: entries, each new or in the place of the one about the same thing, and those that are taken back. */
export interface AsCutChange {
  readonly entries: readonly AsCutEntry[];
  readonly takenBack: readonly AsCut[];
  /** The step that is done with it, if it was not ticked yet. */
  readonly tick: string | null;
}

export function useAsCut(order: Order, bench: Pick<BenchState, "ticks" | "asCut">) {
  const client = useQueryClient();
  const { id: orderId, revisionId, snapshot } = order;
  const { ticks, asCut } = bench;
  const key = orderKeys.progress(orderId, revisionId);
  const ticked = useMemo(() => new Set(ticks.keys()), [ticks]);
  const entries = useMemo(() => asCut.map(({ entry }) => entry), [asCut]);
  const effect = useMemo(() => restEffect({ snapshot, ticked, entries }), [snapshot, ticked, entries]);

  const change = useMutation({
    mutationFn: async ({ entries: wanted, takenBack, tick }: AsCutChange) => {
      const address = { orderId, revisionId };
      let now: readonly AsCut[] = asCut;
      if (tick !== null) await tickStep({ ...address, stepId: tick });
      for (const entry of takenBack) now = (await removeAsCut(address, entry)).asCut;
      for (const entry of wanted) {
        const seen = asCut.find((one) => asCutSubject(one.entry) === asCutSubject(entry));
        now = (await enterAsCut(address, entry, seen?.version ?? null)).asCut;
      }
      return [...now];
    },
    onMutate: () => client.cancelQueries({ queryKey: key }),
    onSuccess: (now) =>
      client.setQueryData(key, (before: OrderProgress | undefined) => (before ? { ...before, asCut: now } : before)),
    // Ticks may have come with it, and what is refused was refused because somebody else was quicker.
    onSettled: () => client.invalidateQueries({ queryKey: key }),
  });

  return {
    asCut,
    effect,
    /** What these entries would come to, in the place of those about the same things. */
    effectWith: (wanted: readonly AsCutEntry[], without: readonly AsCut[], tick: string | null) => {
      const replaced = new Set([...wanted.map(asCutSubject), ...without.map(({ entry }) => asCutSubject(entry))]);
      const others = entries.filter((entry) => !replaced.has(asCutSubject(entry)));
      return restEffect({
        snapshot,
        ticked: tick === null ? ticked : new Set([...ticked, tick]),
        entries: [...others, ...wanted],
      });
    },
    save: change.mutateAsync,
    pending: change.isPending,
    error: change.error,
    reset: change.reset,
  };
}

export type AsCutState = ReturnType<typeof useAsCut>;
