"use client";
import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { Modal } from "@/components/ui/modal";
import { shopQuery } from "@/lib/client/shop";
import { um } from "@/lib/layout";
import { usualLimits } from "@/lib/schemas/saw-limits";
import type { Shop } from "@/lib/schemas/shop";
import { sawKindNames, sawTakes } from "@/lib/words/saw";
import { type SawDraft, SawForm } from "./saw-form";

/** Full kerf 1/8 in: several saw makers' and magazines' figures; measure, do not assume. */
const freshSaw: SawDraft = { id: null, name: "", kind: "table", kerf: um(3175), cleanUp: um(0), limits: usualLimits.table };

export function Saws({ initial, mayEdit }: { initial: Shop; mayEdit: boolean }) {
  const { data: shop } = useQuery({ ...shopQuery(), initialData: initial });
  const { print } = useUnits();
  const [draft, setDraft] = useState<SawDraft | null>(null);
  return (
    <section aria-labelledby="saws" className="max-w-4xl">
      <div className="mb-3 flex items-center justify-between gap-3">
        <h2 id="saws" className="text-xl">
          Saws
        </h2>
        {mayEdit && <Button onClick={() => setDraft(freshSaw)}>Add a saw</Button>}
      </div>
      <div className="overflow-x-auto">
        <table className="w-full text-left">
          <thead className="text-sm text-pencil">
            <tr className="border-b border-rule">
              <th scope="col" className="py-2 pr-4 font-normal">
                Saw
              </th>
              <th scope="col" className="py-2 pr-4 font-normal">
                Kind
              </th>
              <th scope="col" className="py-2 pr-4 text-right font-normal">
                Kerf
              </th>
              <th scope="col" className="py-2 pr-4 text-right font-normal">
                Clean-up each edge
              </th>
              <th scope="col" className="py-2 pr-4 font-normal">
                Takes
              </th>
              {mayEdit && (
                <th scope="col">
                  <span className="sr-only">Change</span>
                </th>
              )}
            </tr>
          </thead>
          <tbody>
            {shop.saws.map((saw) => (
              <tr key={saw.id} className="border-b border-rule">
                <td className="py-2 pr-4">{saw.name}</td>
                <td className="py-2 pr-4 text-pencil">{sawKindNames[saw.kind]}</td>
                <td className="measure py-2 pr-4 text-right whitespace-nowrap">{print(saw.kerf)}</td>
                <td className="measure py-2 pr-4 text-right whitespace-nowrap">{print(saw.cleanUp)}</td>
                <td className="py-2 pr-4 text-sm text-pencil">{sawTakes(saw.limits, print)}</td>
                {mayEdit && (
                  <td className="py-1 text-right">
                    <Button kind="quiet" size="small" aria-label={`Change ${saw.name}`} onClick={() => setDraft(saw)}>
                      Change
                    </Button>
                  </td>
                )}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <Modal
        open={draft !== null}
        onOpenChange={(open) => !open && setDraft(null)}
        title={draft?.id ? "Change saw" : "Add a saw"}
        lead="Make a cut in scrap and measure it: the kerf decides where every piece lies."
      >
        {draft && <SawForm draft={draft} onChange={setDraft} onDone={() => setDraft(null)} />}
      </Modal>
    </section>
  );
}
