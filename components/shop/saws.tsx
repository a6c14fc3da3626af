"use client";
import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { Modal } from "@/components/ui/modal";
import { Notice } from "@/components/ui/notice";
import { messageOf } from "@/lib/client/fault-from-server";
import { createSaw, shopKey, shopQuery, updateSaw } from "@/lib/client/shop";
import { um } from "@/lib/layout";
import type { Saw, Shop } from "@/lib/schemas/shop";

const kinds = { table: "Table saw", track: "Track saw", band: "Band saw", hand: "Hand saw" } as const;
const isKind = (text: string): text is Saw["kind"] => text in kinds;

type Draft = Omit<Saw, "id"> & { id: string | null };
/** Full kerf 1/8 in: several saw makers' and magazines' figures; measure, do not assume. */
const freshSaw: Draft = { id: null, name: "", kind: "table", kerf: um(3175), cleanUp: um(0) };

export function Saws({ initial, mayEdit }: { initial: Shop; mayEdit: boolean }) {
  const { data: shop } = useQuery({ ...shopQuery(), initialData: initial });
  const { print } = useUnits();
  const [draft, setDraft] = useState<Draft | null>(null);
  return (
    <section aria-labelledby="saws" className="max-w-2xl">
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
                <td className="py-2 pr-4 text-pencil">{kinds[saw.kind]}</td>
                <td className="measure py-2 pr-4 text-right whitespace-nowrap">{print(saw.kerf)}</td>
                <td className="measure py-2 pr-4 text-right whitespace-nowrap">{print(saw.cleanUp)}</td>
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

function SawForm({ draft, onChange, onDone }: { draft: Draft; onChange: (draft: Draft) => void; onDone: () => void }) {
  const client = useQueryClient();
  const save = useMutation({
    mutationFn: ({ id, ...fields }: Draft) => (id === null ? createSaw(fields) : updateSaw(id, fields)),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: shopKey });
      onDone();
    },
  });
  return (
    <form
      className="flex flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        save.mutate(draft);
      }}
    >
      <TextField
        label="Name"
        required
        maxLength={80}
        value={draft.name}
        onChange={(event) => onChange({ ...draft, name: event.target.value })}
      />
      <SelectField
        label="Kind"
        value={draft.kind}
        onChange={(event) => isKind(event.target.value) && onChange({ ...draft, kind: event.target.value })}
      >
        {Object.entries(kinds).map(([kind, name]) => (
          <option key={kind} value={kind}>
            {name}
          </option>
        ))}
      </SelectField>
      <LengthField
        label="Kerf"
        required
        hint="What the blade takes out"
        value={draft.kerf}
        onChange={(kerf) => kerf !== null && onChange({ ...draft, kerf })}
      />
      <LengthField
        label="Clean-up of each edge"
        required
        hint="What jointing, planing or shooting takes afterwards; 0 for edges left from the saw"
        value={draft.cleanUp}
        onChange={(cleanUp) => cleanUp !== null && onChange({ ...draft, cleanUp })}
      />
      {save.isError && <Notice kind="stop">{messageOf(save.error)}</Notice>}
      <Button type="submit" kind="primary" disabled={save.isPending}>
        Save saw
      </Button>
    </form>
  );
}
