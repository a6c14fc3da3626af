"use client";
import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { v7 as newId } from "uuid";
import { suggestionsQuery } from "@/lib/client/figure";
import type { SuggestedArea } from "@/lib/schemas/figure";
import type { KeepClearArea } from "@/lib/schemas/zones";
import { useUnits } from "../shell/units";
import { Button } from "../ui/button";
import { PanelSection } from "../ui/panel-section";
import { areaAt } from "./area-at";
import type { ZonesState } from "./use-zones";
import { kindNames, middleOf, placeWords } from "./zone-words";
import { withArea } from "./zones-doc";

interface Props {
  straighteningId: string;
  zones: ZonesState;
  /** Brings the place of an area into view. */
  onLook: (area: KeepClearArea) => void;
}

/** Places that look like knots. Nothing is kept clear by itself: the eye decides on each. */
export function SuggestionPanel({ straighteningId, zones, onLook }: Props) {
  const { style } = useUnits();
  const [asked, setAsked] = useState(false);
  const [left, setLeft] = useState<ReadonlySet<number>>(new Set());
  const query = useQuery({ ...suggestionsQuery(straighteningId), enabled: asked });
  const open = (query.data?.items ?? []).flatMap((item, index) =>
    left.has(index) || isHere(zones, item) ? [] : [{ index, area: asArea(item) }],
  );
  const take = (areas: readonly KeepClearArea[]) =>
    zones.change(areas.reduce((doc, area) => withArea(doc, { ...area, id: newId() }), zones.doc));
  return (
    <PanelSection
      title="Suggested"
      lead="Places that look like knots in the photograph. Look at each: nothing is kept clear by itself."
    >
      {!asked && (
        <Button size="small" onClick={() => setAsked(true)}>
          Look for knots
        </Button>
      )}
      <p role="status" className="text-sm text-pencil empty:hidden">
        {asked && query.isPending && "Looking at the photograph…"}
        {query.isError && "The photograph could not be read. Try again later."}
        {query.isSuccess && open.length === 0 && "Nothing found that is not here already."}
      </p>
      {open.length > 0 && (
        <>
          <ol className="flex flex-col gap-1">
            {open.map(({ index, area }) => (
              <li key={index} className="flex flex-wrap items-center gap-2">
                <button
                  type="button"
                  className="flex min-h-11 grow flex-col items-start justify-center rounded-md px-2 text-left hover:bg-chalk-wash"
                  onClick={() => onLook(area)}
                >
                  <span className="font-semibold">{kindNames[area.kind]}?</span>
                  <span className="measure text-sm text-pencil">{placeWords(middleOf(area), style)}</span>
                </button>
                <Button size="small" onClick={() => take([area])}>
                  Keep clear
                </Button>
                <Button size="small" onClick={() => setLeft(new Set([...left, index]))}>
                  Leave
                </Button>
              </li>
            ))}
          </ol>
          {open.length > 1 && (
            <Button size="small" onClick={() => take(open.map(({ area }) => area))}>
              Keep all {open.length} clear
            </Button>
          )}
        </>
      )}
    </PanelSection>
  );
}

const asArea = ({ kind, area }: SuggestedArea): KeepClearArea => ({ id: "suggested", kind, area, note: "" });

/** Whether the middle of what is suggested lies in an area that is drawn already. */
function isHere({ doc }: ZonesState, item: SuggestedArea): boolean {
  return areaAt(doc.keepClear, middleOf(asArea(item)), 0) !== null;
}
