"use client";
import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { Modal } from "@/components/ui/modal";
import { Notice } from "@/components/ui/notice";
import { messageOf } from "@/lib/client/fault-from-server";
import { jobKeys, updateJob } from "@/lib/client/job";
import { movementSettingsQuery } from "@/lib/client/movement";
import { type Climate, defaultClimate } from "@/lib/layout";
import type { Job } from "@/lib/schemas/job";
import { climateText } from "@/lib/words/movement";
import { ClimateFields, inOrder } from "./climate-fields";

/** Where the furniture of a job will live: as the shop's usually does, or told for itself. */
export function JobPlace({ job, mayEdit }: { job: Job; mayEdit: boolean }) {
  const { style } = useUnits();
  const { data: settings } = useQuery(movementSettingsQuery());
  const [editing, setEditing] = useState(false);
  const climate = job.climate ?? settings?.climate;
  return (
    <section id="place" aria-labelledby="place-title" className="mx-4 mb-5 flex flex-wrap items-center gap-x-4 gap-y-2 md:mx-5">
      <h2 id="place-title" className="text-lg">
        Where it will live
      </h2>
      <p className="text-sm">
        {climate ? climateText(climate, style) : "…"}{" "}
        <span className="text-pencil">({job.climate ? "for this job" : "as for the shop"})</span>
      </p>
      {mayEdit && (
        <Button size="small" onClick={() => setEditing(true)}>
          Change where it will live
        </Button>
      )}
      <Modal
        open={editing}
        onOpenChange={setEditing}
        title="Where it will live"
        lead="Between its driest and its dampest the wood moves. The layout tables of this job show what that does to the gaps."
      >
        {editing && <PlaceForm job={job} start={climate ?? defaultClimate} onDone={() => setEditing(false)} />}
      </Modal>
    </section>
  );
}

function PlaceForm({ job, start, onDone }: { job: Job; start: Climate; onDone: () => void }) {
  const client = useQueryClient();
  const [climate, setClimate] = useState(start);
  const save = useMutation({
    mutationFn: (chosen: Climate | null) => updateJob(job.id, { baseRevision: job.revision, climate: chosen }),
    onSuccess: (saved) => {
      client.setQueryData(jobKeys.one(job.id), saved);
      onDone();
    },
  });
  return (
    <form
      className="flex flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        save.mutate(climate);
      }}
    >
      <ClimateFields climate={climate} onChange={setClimate} />
      {save.isError && <Notice kind="stop">{messageOf(save.error)}</Notice>}
      <div className="flex flex-wrap gap-3">
        <Button type="submit" kind="primary" disabled={save.isPending || !inOrder(climate)}>
          Use for this job
        </Button>
        {job.climate !== null && (
          <Button disabled={save.isPending} onClick={() => save.mutate(null)}>
            As for the shop
          </Button>
        )}
      </div>
    </form>
  );
}
