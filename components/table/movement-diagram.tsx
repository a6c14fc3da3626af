"use client";
/**
 * One gap against the moisture of the wood, from the driest of the year to the dampest: a straight line, because that is what the
 * equation says. Months are not drawn, since nobody knows them. Today's gap is a point of its own: board and surround may be at
 * moistures that they will not share again.
 */
import { useUnits } from "@/components/shell/units";
import { factsOf } from "@/lib/editor/selectors/facts";
import { type GapFigures, type GapThroughYear, mmFromUm, printedLength, type Um } from "@/lib/layout";
import { betweenText, percentText } from "@/lib/words/movement";
import { diagramScale } from "./movement-scale";
import type { Movement } from "./use-movement";

interface Props {
  gap: GapThroughYear;
  figures: GapFigures;
  movement: Movement;
}

export function MovementDiagram({ gap, figures, movement: { request } }: Props) {
  const { style, print } = useUnits();
  const { year, leastGap, layout, woods } = request;
  const stockId = factsOf(layout).pieceById.get(gap.a)?.stockId;
  const today = stockId === undefined ? null : (woods.get(stockId)?.moisture ?? null);
  const scale = diagramScale({ ...year, today }, [figures.driest, figures.dampest, gap.gap, leastGap].map(mmFromUm));
  const dry = { x: scale.x(year.driest), y: scale.y(mmFromUm(figures.driest)) };
  const damp = { x: scale.x(year.dampest), y: scale.y(mmFromUm(figures.dampest)) };
  const least = scale.y(mmFromUm(leastGap));
  const closed = scale.y(0);
  const figure = (width: Um) => printedLength(width, style).figure;
  const said = `Gap ${betweenText(gap)}: ${print(figures.driest)} at the driest (${percentText(year.driest)}), ${print(gap.gap)} today${
    today === null ? "" : ` (${percentText(today)})`
  }, ${print(figures.dampest)} at the dampest (${percentText(year.dampest)}); least ${print(leastGap)}.`;
  return (
    <figure className="flex flex-col gap-1">
      <svg viewBox={`0 0 ${scale.width} ${scale.height}`} role="img" aria-label={said} className="w-full fill-graphite text-xs">
        <line x1={scale.left} x2={scale.right} y1={closed} y2={closed} className="stroke-crayon" strokeWidth={1.5} />
        <text x={scale.left - 4} y={closed + 4} textAnchor="end" className="fill-crayon">
          closed
        </text>
        {leastGap > 0 && (
          <>
            <line x1={scale.left} x2={scale.right} y1={least} y2={least} className="stroke-pencil" strokeDasharray="4 3" />
            <text x={scale.left - 4} y={least + (closed - least < 14 ? -2 : 4)} textAnchor="end" className="fill-pencil">
              least {figure(leastGap)}
            </text>
          </>
        )}
        <line x1={dry.x} y1={dry.y} x2={damp.x} y2={damp.y} className="stroke-graphite" strokeWidth={2} />
        <circle cx={dry.x} cy={dry.y} r={3} />
        <circle cx={damp.x} cy={damp.y} r={3} />
        <text x={dry.x} y={dry.y - 7} textAnchor="start" className="measure">
          {figure(figures.driest)}
        </text>
        <text x={damp.x} y={damp.y - 7} textAnchor="end" className="measure">
          {figure(figures.dampest)}
        </text>
        {today !== null && (
          <circle cx={scale.x(today)} cy={scale.y(mmFromUm(gap.gap))} r={4.5} className="fill-tape stroke-graphite" />
        )}
        <text x={dry.x} y={scale.height - 4} textAnchor="start" className="fill-pencil">
          driest {percentText(year.driest)}
        </text>
        <text x={damp.x} y={scale.height - 4} textAnchor="end" className="fill-pencil">
          dampest {percentText(year.dampest)}
        </text>
      </svg>
      <figcaption className="text-xs text-pencil">
        The gap {betweenText(gap)} against the moisture of the wood, driest season to dampest
        {today !== null && `; the yellow point is today, the board at ${percentText(today)}`}.
      </figcaption>
    </figure>
  );
}
