"use client";
/** Under a step: what was really cut, and a front that went wrong. */
import { useState } from "react";
import type { Order } from "@/lib/schemas/order";
import type { OrderStep } from "@/lib/schemas/order-steps";
import { Button } from "../ui/button";
import { Notice } from "../ui/notice";
import { kerfAsked, sizesAsked } from "./as-cut-draft";
import { AsCutSheet } from "./as-cut-sheet";
import { SpoiledSheet } from "./spoiled-sheet";
import type { AsCutState } from "./use-as-cut";

interface Props {
  order: Order;
  step: OrderStep;
  ticked: boolean;
  asCut: AsCutState;
}

export function CutActions({ order, step, ticked, asCut }: Props) {
  const [sheet, setSheet] = useState<"as-cut" | "spoiled" | null>(null);
  const measured = kerfAsked(step, order.snapshot) !== null || sizesAsked(step).length > 0;
  const spoilable = step.kind === "cut" || step.kind === "clean-up" || step.kind === "rack";
  const show = (which: "as-cut" | "spoiled" | null) => {
    asCut.reset();
    setSheet(which);
  };
  return (
    <>
      {!ticked && asCut.effect.waiting.has(step.id) && (
        <Notice kind="stop">
          <p className="text-base font-semibold">Do not make this cut yet: it changes with what was entered.</p>
          <p className="text-base">Ask the maker to issue the rest.</p>
        </Notice>
      )}
      {(measured || spoilable) && (
        <div className="grid grid-cols-2 gap-2.5">
          {measured && (
            <Button className="min-h-12!" onClick={() => show("as-cut")}>
              As cut
            </Button>
          )}
          {spoilable && (
            <Button className="min-h-12!" onClick={() => show("spoiled")}>
              Spoiled front
            </Button>
          )}
        </div>
      )}
      <AsCutSheet
        order={order}
        step={step}
        ticked={ticked}
        asCut={asCut}
        open={sheet === "as-cut"}
        onOpenChange={(open) => show(open ? "as-cut" : null)}
      />
      <SpoiledSheet
        board={step.board}
        about={piecesOf(step)}
        asCut={asCut}
        open={sheet === "spoiled"}
        onOpenChange={(open) => show(open ? "spoiled" : null)}
      />
    </>
  );
}

/** The fronts that a step is about. */
function piecesOf(step: OrderStep): readonly string[] {
  if (step.kind === "cut") return step.cut.yields.flatMap(({ pieceId }) => pieceId ?? []);
  if (step.kind !== "clean-up") return [];
  return step.board.pieces.filter(({ label }) => step.group.labels.includes(label)).map(({ pieceId }) => pieceId);
}
