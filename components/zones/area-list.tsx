"use client";
import { Trash2 } from "lucide-react";
import type { KeepClearArea } from "@/lib/schemas/zones";
import { useUnits } from "../shell/units";
import { AreaPanel } from "./area-panel";
import type { ZonesState } from "./use-zones";
import { kindNames, middleOf, placeWords } from "./zone-words";
import { withoutArea } from "./zones-doc";

/** All keep-clear areas, each with the way to it. */
export function AreaList({ zones, onShow }: { zones: ZonesState; onShow: (area: KeepClearArea) => void }) {
  const { style } = useUnits();
  const { doc, selectedArea } = zones;
  if (doc.keepClear.length === 0) return <p className="text-sm text-pencil">Nothing to keep clear of yet.</p>;
  return (
    <ol className="flex flex-col gap-2">
      {doc.keepClear.map((area, index) => (
        <li key={area.id}>
          <div className="flex items-center gap-1">
            <button
              type="button"
              aria-pressed={area.id === selectedArea?.id}
              className="flex min-h-11 grow flex-col items-start justify-center rounded-md px-2 text-left hover:bg-chalk-wash aria-pressed:bg-chalk-wash"
              onClick={() => onShow(area)}
            >
              <span className="font-semibold">
                {index + 1}. {kindNames[area.kind]}
                {area.note && <span className="font-normal">: {area.note}</span>}
              </span>
              <span className="measure text-sm text-pencil">{placeWords(middleOf(area), style)}</span>
            </button>
            <button
              type="button"
              aria-label={`Remove area ${index + 1}, ${kindNames[area.kind].toLowerCase()}`}
              className="grid size-11 shrink-0 place-items-center rounded-md text-crayon hover:bg-crayon-wash"
              onClick={() => {
                zones.change(withoutArea(doc, area.id));
                if (area.id === selectedArea?.id) zones.select(null);
              }}
            >
              <Trash2 className="size-5" aria-hidden="true" />
            </button>
          </div>
          {area.id === selectedArea?.id && <AreaPanel key={area.id} area={area} zones={zones} />}
        </li>
      ))}
    </ol>
  );
}
