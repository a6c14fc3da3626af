"use client";
import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { toast } from "sonner";
import { Button } from "@/components/ui/button";
import { Modal } from "@/components/ui/modal";
import { messageOf } from "@/lib/client/fault-from-server";
import { deleteSpecies, speciesKey, speciesQuery } from "@/lib/client/species";
import { knownSpecies } from "@/lib/layout";
import { type OwnSpecies, speciesOf } from "@/lib/schemas/species";
import { freshSpecies, type SpeciesDraft, speciesDraft } from "./species-draft";
import { SpeciesForm } from "./species-form";
import { SpeciesTable } from "./species-table";

/** The shop's own species and the published ones, each with where its figures are from. */
export function SpeciesList({ initial, mayEdit }: { initial: OwnSpecies[]; mayEdit: boolean }) {
  const { data } = useQuery({ ...speciesQuery(), initialData: { items: initial } });
  const [draft, setDraft] = useState<SpeciesDraft | null>(null);
  const own = data.items.map(speciesOf);
  const found = (key: string) => data.items.find(({ id }) => id === key);
  return (
    <section aria-labelledby="species" className="max-w-4xl">
      <div className="mb-3 flex flex-wrap items-center justify-between gap-3">
        <h2 id="species" className="text-xl">
          Species
        </h2>
        {mayEdit && <Button onClick={() => setDraft(freshSpecies)}>Add a species</Button>}
      </div>
      <p className="mb-3 max-w-2xl text-sm">
        How wood moves across its grain, and where that is known from. A board is matched by its name. One board may differ a lot
        from the average of its species.
      </p>
      {own.length > 0 && (
        <SpeciesTable
          caption="Your own"
          species={own}
          actions={
            mayEdit
              ? (key, name) => {
                  const one = found(key);
                  return (
                    one && <SpeciesActions key={key} species={one} name={name} onChange={() => setDraft(speciesDraft(one))} />
                  );
                }
              : null
          }
        />
      )}
      <details className="mt-3">
        <summary className="min-h-8 text-chalk">Published and usual figures, {knownSpecies.length} species</summary>
        <div className="mt-2">
          <SpeciesTable caption="Published and usual figures" species={knownSpecies} actions={null} />
        </div>
      </details>
      <Modal
        open={draft !== null}
        onOpenChange={(open) => !open && setDraft(null)}
        title={draft?.id ? "Change species" : "Add a species"}
        lead="Makers stake wood on these figures. Say where they are from."
      >
        {draft && <SpeciesForm draft={draft} onChange={setDraft} onDone={() => setDraft(null)} />}
      </Modal>
    </section>
  );
}

function SpeciesActions({ species, name, onChange }: { species: OwnSpecies; name: string; onChange: () => void }) {
  const client = useQueryClient();
  const [asking, setAsking] = useState(false);
  const remove = useMutation({
    mutationFn: () => deleteSpecies(species.id),
    onSuccess: () => client.invalidateQueries({ queryKey: speciesKey }),
    onError: (error) => toast.error(messageOf(error)),
  });
  return (
    <span className="flex justify-end gap-1">
      <Button kind="quiet" size="small" aria-label={`Change ${name}`} onClick={onChange}>
        Change
      </Button>
      <Button kind="quiet" size="small" aria-label={`Remove ${name}`} onClick={() => setAsking(true)}>
        Remove
      </Button>
      <Modal
        open={asking}
        onOpenChange={setAsking}
        title={`Remove ${name}?`}
        lead="Faces that use it go by the names of their boards again, or ask for another."
      >
        <Button kind="danger" disabled={remove.isPending} onClick={() => remove.mutate()}>
          Remove species
        </Button>
      </Modal>
    </span>
  );
}
