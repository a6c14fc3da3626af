"use client";
/** What a resawn pair takes, and what the resaw does to its figure. */
import { useUnits } from "@/components/shell/units";
import { resawnPlan, um } from "@/lib/layout";
import { PanelSection } from "./panel-section";
import { useLiveLayout } from "./use-live-layout";

export function LeavesSection() {
  const { print } = useUnits();
  const plan = resawnPlan(useLiveLayout());
  if (plan === null) return null;
  return (
    <PanelSection title="Resawing">
      <dl className="grid grid-cols-[1fr_auto] gap-x-4 gap-y-1 text-sm">
        <dt>Wood it takes, along and across</dt>
        <dd className="measure text-right">
          {print(plan.wood.length)} × {print(plan.wood.width)}
        </dd>
        <dt>Thickness of the stock, rough</dt>
        <dd className="measure text-right">{print(plan.roughThickness)}</dd>
        <dt>Lost between the two show faces</dt>
        <dd className="measure text-right">{print(plan.thicknessLoss)}</dd>
        <dt>Jump at the seam, across the grain</dt>
        <dd className="measure text-right">{plan.jump === null ? "not known" : print(um(Math.abs(plan.jump)))}</dd>
      </dl>
      <p className="text-xs text-pencil">
        The photograph shows the outer face. The leaves show the wood inside it, so the picture is close to the truth and no more.
        {plan.jump === null && " Enter how the figure leans under Sizes to know the jump."}
      </p>
    </PanelSection>
  );
}
