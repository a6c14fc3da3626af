"use client";
import { useMemo } from "react";
import { v7 as newId } from "uuid";
import type { Straightening } from "@/lib/schemas/straightening";
import { Button } from "../ui/button";
import { PanelSection } from "../ui/panel-section";
import { fromOtherSide } from "./other-side";
import type { ZonesState } from "./use-zones";

/** Offers what was drawn on the other side. Nothing is taken over by itself: a knot may be on one side only. */
export function OtherSidePanel({ zones, from }: { zones: ZonesState; from: Straightening }) {
  const { doc, size } = zones;
  const offered = useMemo(() => fromOtherSide(from.zones, doc, size), [from.zones, doc, size]);
  const { areas, off, outline, glueLines } = offered;
  const name = from.side === "back" ? "the back" : "the face";
  const nothing = areas.length === 0 && outline === null && glueLines.length === 0;
  return (
    <PanelSection
      title={from.side === "back" ? "From the back" : "From the face"}
      lead={`What is drawn on ${name} lies here turned over about the long edge. Look whether it goes through the wood before you take it over.`}
    >
      {nothing && <p className="text-sm text-pencil">Nothing on {name} that is not here already.</p>}
      <div className="flex flex-wrap gap-2 empty:hidden">
        {areas.length > 0 && (
          <Button
            size="small"
            onClick={() =>
              zones.change({ ...doc, keepClear: [...doc.keepClear, ...areas.map((area) => ({ ...area, id: newId() }))] })
            }
          >
            Take over {areas.length === 1 ? "1 keep-clear area" : `${areas.length} keep-clear areas`}
          </Button>
        )}
        {outline && (
          <Button size="small" onClick={() => zones.change({ ...doc, outline })}>
            Take over the outline
          </Button>
        )}
        {glueLines.length > 0 && (
          <Button
            size="small"
            onClick={() => zones.change({ ...doc, glueLines: glueLines.map((line) => ({ ...line, id: newId() })) })}
          >
            Take over {glueLines.length === 1 ? "1 glue line" : `${glueLines.length} glue lines`}
          </Button>
        )}
      </div>
      {off > 0 && (
        <p className="text-sm text-pencil">
          {off === 1 ? "1 area" : `${off} areas`} of {name} would lie off this picture.
        </p>
      )}
    </PanelSection>
  );
}
