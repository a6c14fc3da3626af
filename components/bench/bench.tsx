"use client";
/** A cut order at the bench: one step at a time, made for a thumb. */
import Link from "next/link";
import { useState } from "react";
import { messageOf } from "@/lib/client/fault-from-server";
import type { Order } from "@/lib/schemas/order";
import { revisionLetter } from "@/lib/words/revision-letter";
import { StepTape } from "../order/step-tape";
import { Notice } from "../ui/notice";
import { BenchButtons } from "./bench-buttons";
import { CutActions } from "./cut-actions";
import { EnteredList } from "./entered-list";
import { OrderDone } from "./order-done";
import { StepCard } from "./step-card";
import { StepList } from "./step-list";
import { SupersededStop } from "./superseded-stop";
import { useAsCut } from "./use-as-cut";
import { useBench } from "./use-bench";

export function Bench({ order }: { order: Order }) {
  const bench = useBench(order);
  const asCut = useAsCut(order, bench);
  const [listOpen, setListOpen] = useState(false);
  const { steps, ticks, at, step } = bench;
  const done = steps.map(({ id }) => ticks.has(id));
  const allDone = done.every(Boolean);
  return (
    <div className="flex min-h-dvh flex-col bg-paper">
      <header className="bg-graphite text-white">
        <div className="mx-auto flex max-w-3xl items-center justify-between gap-3 px-4 py-2">
          <Link href={`/orders/${order.id}`} className="measure min-w-0 truncate py-1.5 text-lg focus-visible:outline-tape">
            Order {order.number} {revisionLetter(order.revision)}, {order.jobTitle}
          </Link>
          <span className="shrink-0">
            step {at + 1} of {steps.length}
          </span>
        </div>
        <StepTape steps={steps.length} done={done} at={bench.superseded || allDone ? null : at} />
      </header>
      {bench.superseded ? (
        <SupersededStop order={order} newestRevision={bench.newestRevision} />
      ) : (
        <>
          <main className="mx-auto flex w-full max-w-3xl grow flex-col gap-3 p-4">
            {bench.connectionError && (
              <Notice kind="care">{messageOf(bench.connectionError)} What others do is not shown until then.</Notice>
            )}
            {allDone && <OrderDone order={order} />}
            {step && <StepCard key={step.id} order={order} step={step} before={steps[at - 1]} tick={ticks.get(step.id)} />}
            {step && <CutActions key={`as-cut ${step.id}`} order={order} step={step} ticked={ticks.has(step.id)} asCut={asCut} />}
            <EnteredList order={order} asCut={asCut} />
          </main>
          <BenchButtons bench={bench} onList={() => setListOpen(true)} />
          <StepList bench={bench} order={order} open={listOpen} onOpenChange={setListOpen} />
        </>
      )}
    </div>
  );
}
