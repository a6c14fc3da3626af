"use client";
/** Gaps through the year, equal ones in one row, with the chosen one drawn. */
import { useState } from "react";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { evenGaps } from "@/lib/editor/commands/even-gaps";
import {
  canEvenGaps,
  facePieces,
  printedLength,
  recommendedGap,
  roundedUp,
  ruleStepOf,
  sheetAtMost,
  type Um,
  um,
} from "@/lib/layout";
import { betweenText } from "@/lib/words/movement";
import { type GapRow, gapRows } from "./gap-rows";
import { MovementDiagram } from "./movement-diagram";
import { useTableContext } from "./table-context";
import type { Movement } from "./use-movement";

export function MovementGaps({ movement }: { movement: Movement }) {
  const { style, units } = useUnits();
  const rows = gapRows(movement.outcome.gaps);
  const [chosenKey, choose] = useState<string | null>(null);
  const chosen = rows.find(({ key }) => key === chosenKey) ?? tightest(rows);
  if (rows.length === 0) {
    const fronts = facePieces(movement.request.layout).some(({ role }) => role === "front");
    return (
      <p className="text-sm text-pencil">
        {fronts
          ? "No gaps between the fronts. Enter the gap round them to see that."
          : "This face has no gaps that open and close: its pieces meet at joints and corners."}
      </p>
    );
  }
  return (
    <>
      <div className="max-h-72 overflow-y-auto">
        <table className="w-full text-sm">
          <caption className="pb-1 text-left text-xs text-pencil">
            Gap in {units === "mm" ? "mm" : "inches"}; “to cut” is today’s that keeps the least gap all year.
          </caption>
          <thead className="sticky top-0 bg-sheet text-left text-pencil">
            <tr>
              <th scope="col" className="py-1 font-normal">
                gap
              </th>
              {["today", "driest", "dampest", "to cut"].map((name) => (
                <th key={name} scope="col" className="py-1 pl-1 text-right font-normal">
                  {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody className="measure">
            {rows.map((row) => (
              <GapLine
                key={row.key}
                row={row}
                leastGap={movement.facts.leastGap}
                chosen={row.key === chosen?.key}
                onChoose={() => choose(row.key)}
              />
            ))}
          </tbody>
        </table>
      </div>
      {chosen?.gap.figures && <MovementDiagram gap={chosen.gap} figures={chosen.gap.figures} movement={movement} />}
      <UseRecommended movement={movement} />
      {movement.facts.choices.surround.kind === "sheet" && (
        <p className="text-xs text-pencil">
          MDF may grow by up to 0.33 % from 50 to 90 % humidity (ANSI A208.2); at the widest of these gaps that is up to{" "}
          {printedLength(sheetAtMost(widest(rows)), style).text}, not counted here. Plywood moves less (common practice).
        </p>
      )}
    </>
  );
}

interface LineProps {
  row: GapRow;
  leastGap: Um;
  chosen: boolean;
  onChoose: () => void;
}

function GapLine({ row: { gap, pieces, count }, leastGap, chosen, onChoose }: LineProps) {
  const { editor } = useTableContext();
  const { style } = useUnits();
  const print = (width: Um) => printedLength(width, style).figure;
  const { figures } = gap;
  return (
    <tr className={`border-t border-rule hover:bg-chalk-wash ${chosen ? "bg-chalk-wash" : ""}`}>
      <td className="py-0.5">
        <button
          type="button"
          aria-pressed={chosen}
          onClick={() => {
            onChoose();
            editor.select(pieces);
          }}
          className="min-h-8 text-left font-sans font-normal text-chalk underline-offset-2 hover:underline"
        >
          {betweenText(gap)}
          {count > 1 && <span className="block text-pencil">and {count - 1} alike</span>}
        </button>
      </td>
      <td className="pl-1 text-right">{print(gap.gap)}</td>
      {figures === null ? (
        <td colSpan={3} className="pl-1 text-right font-sans font-normal text-pencil">
          not known
        </td>
      ) : (
        <>
          <Width width={figures.driest} leastGap={leastGap} />
          <Width width={figures.dampest} leastGap={leastGap} />
          <td className="pl-1 text-right">{print(roundedUp(figures.toCut, ruleStepOf(style)))}</td>
        </>
      )}
    </tr>
  );
}

/** Too narrow is said by a mark and a word, not by the colour alone. */
function Width({ width, leastGap }: { width: Um; leastGap: Um }) {
  const { style } = useUnits();
  if (width <= 0) return <td className="pl-1 text-right font-sans font-semibold text-crayon">closes</td>;
  if (width >= leastGap) return <td className="pl-1 text-right">{printedLength(width, style).figure}</td>;
  return (
    <td className="pl-1 text-right text-crayon">
      <span aria-hidden="true">‹</span>
      {printedLength(width, style).figure}
      <span className="sr-only"> too narrow</span>
    </td>
  );
}

const lines = [
  { runs: "upright", name: "up and down" },
  { runs: "sideways", name: "sideways" },
] as const;

/** One step of the layout, undone like any other. */
function UseRecommended({ movement: { request, outcome } }: { movement: Movement }) {
  const { editor } = useTableContext();
  const { style, print } = useUnits();
  const step = ruleStepOf(style);
  const offers = lines.flatMap(({ runs, name }) => {
    const gap = recommendedGap(outcome, runs, step);
    const between = outcome.gaps.filter((one) => one.runs === runs && "piece" in one.b);
    // What is left over in a last gap does not count.
    const differs = gap !== null && between.some((one) => Math.abs(one.gap - gap) > between.length);
    return differs ? [{ runs, name, gap, wider: between.some((one) => one.gap < gap) }] : [];
  });
  if (!editor.mayChange || !canEvenGaps(request.layout.face)) return null;
  const { layout: _, ...ground } = request;
  return offers.map(({ runs, name, gap, wider }) => (
    <div key={runs} className="flex flex-col gap-1">
      <Button
        size="small"
        className="self-start"
        onClick={() => editor.run((document) => evenGaps(document, ground, runs, step))}
      >
        Make gaps {name} {print(gap)}
      </Button>
      <p className="text-xs text-pencil">
        {wider ? "The face keeps its size; the fronts give up what the gaps take." : "The face keeps its size; the fronts grow."}
      </p>
    </div>
  ));
}

function tightest(rows: readonly GapRow[]): GapRow | undefined {
  const least = ({ gap: { figures } }: GapRow) =>
    figures ? Math.min(figures.driest, figures.dampest) : Number.POSITIVE_INFINITY;
  return rows.toSorted((p, q) => least(p) - least(q))[0];
}

/** The longest stretch of surround that a gap hangs on. */
const widest = (rows: readonly GapRow[]): Um => um(Math.max(0, ...rows.map(({ gap }) => gap.reachA + gap.gap + gap.reachB)));
