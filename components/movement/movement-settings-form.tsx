"use client";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { toast } from "sonner";
import { Button } from "@/components/ui/button";
import { LengthField } from "@/components/ui/length-field";
import { Notice } from "@/components/ui/notice";
import { NumberField } from "@/components/ui/number-field";
import { messageOf } from "@/lib/client/fault-from-server";
import { movementKeys, updateMovementSettings } from "@/lib/client/movement";
import type { MovementSettings } from "@/lib/schemas/movement";
import { ClimateFields, inOrder } from "./climate-fields";

/** Where the shop's furniture usually lives, and what its gaps may come down to. */
export function MovementSettingsForm({ initial, mayEdit }: { initial: MovementSettings; mayEdit: boolean }) {
  const client = useQueryClient();
  const [settings, setSettings] = useState(initial);
  const save = useMutation({
    mutationFn: () => {
      const { revision, ...fields } = settings;
      return updateMovementSettings({ ...fields, baseRevision: revision });
    },
    onSuccess: (saved) => {
      client.setQueryData(movementKeys.settings, saved);
      setSettings(saved);
      toast.success("Movement settings saved");
    },
  });
  const set = (change: Partial<MovementSettings>) => setSettings((before) => ({ ...before, ...change }));
  return (
    <form
      className="flex max-w-2xl flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        save.mutate();
      }}
    >
      <p className="text-sm">
        Where your furniture usually lives; a job may say otherwise. As delivered: 30 to 60 % humidity at 21 °C (70 °F), the range
        quoted from ASHRAE 62 for heated rooms. A damp house goes higher: measure.
      </p>
      <ClimateFields climate={settings.climate} disabled={!mayEdit} onChange={(climate) => set({ climate })} />
      <div className="grid items-start gap-4 sm:grid-cols-2">
        <LengthField
          label="Least gap through the year"
          hint="Common practice, no source: 1.5 mm or 1⁄16 in."
          required
          disabled={!mayEdit}
          value={settings.leastGap}
          onChange={(leastGap) => leastGap !== null && leastGap >= 0 && set({ leastGap })}
        />
        <NumberField
          label="Board and surround may differ by, % moisture"
          hint="Common practice, no source: 2 %."
          required
          min={0.1}
          max={20}
          disabled={!mayEdit}
          value={settings.moistureLimit}
          onChange={(moistureLimit) => moistureLimit !== null && set({ moistureLimit })}
        />
      </div>
      {save.isError && <Notice kind="stop">{messageOf(save.error)}</Notice>}
      {mayEdit ? (
        <Button type="submit" kind="primary" className="self-start" disabled={save.isPending || !inOrder(settings.climate)}>
          Save movement settings
        </Button>
      ) : (
        <p className="text-sm text-pencil">Only the owner of the shop changes these.</p>
      )}
    </form>
  );
}
