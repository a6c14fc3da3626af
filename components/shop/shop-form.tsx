"use client";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useMemo, useState } from "react";
import { toast } from "sonner";
import { Button } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { Notice } from "@/components/ui/notice";
import { useFocusFirstError } from "@/components/ui/use-focus-first-error";
import { FaultFromServer, messageOf } from "@/lib/client/fault-from-server";
import { shopKey, updateShop } from "@/lib/client/shop";
import type { Shop } from "@/lib/schemas/shop";

type Settings = Omit<Shop, "id" | "revision" | "saws">;

/** Lengths of the shop, each with what it decides. Defaults: common practice, no source, unless said. */
const lengths = [
  {
    name: "shortestCrosscut",
    label: "Shortest crosscut held by hand",
    hint: "Shorter pieces get “clamp it to the gauge” on the order.",
  },
  { name: "narrowestRip", label: "Narrowest rip without a push stick", hint: "Narrower rips get the caution on the order." },
  {
    name: "shortestMachined",
    label: "Shortest through planer and jointer",
    hint: "12 in (300 mm) is the usual least of the machines' manuals.",
  },
  {
    name: "jointing",
    label: "Jointing takes off each glued edge",
    hint: "When boards are edge-glued into a blank, unless said otherwise there.",
  },
  {
    name: "roughLength",
    label: "Rough parts are longer by",
    hint: "Both ends together, until the part is flat. 1/2 in (12.5 mm) in a furniture maker's text.",
  },
  {
    name: "roughWidth",
    label: "Rough parts are wider by",
    hint: "Both long edges together. 3/16 in (5 mm) in the same text.",
  },
  { name: "offcutLength", label: "Offcuts kept from this length", hint: "Smaller ones count as waste." },
  { name: "offcutWidth", label: "Offcuts kept from this width", hint: "Smaller ones count as waste." },
] as const;

export function ShopForm({ shop, mayEdit }: { shop: Shop; mayEdit: boolean }) {
  const client = useQueryClient();
  const router = useRouter();
  const [settings, setSettings] = useState<Settings>(shop);
  const [revision, setRevision] = useState(shop.revision);
  const save = useMutation({
    mutationFn: () => updateShop({ ...settings, baseRevision: revision }),
    onSuccess: (saved) => {
      client.setQueryData(shopKey, saved);
      setRevision(saved.revision);
      // Every screen prints lengths in the shop's units.
      router.refresh();
      toast.success("Settings saved");
    },
  });
  const faults = useMemo(() => fieldFaults(save.error), [save.error]);
  const form = useFocusFirstError(faults);
  const set = (change: Partial<Settings>) => setSettings((before) => ({ ...before, ...change }));
  return (
    <form
      ref={form}
      className="flex max-w-2xl flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        save.mutate();
      }}
    >
      <fieldset disabled={!mayEdit} className="grid gap-4 sm:grid-cols-2">
        <TextField
          label="Name of the shop"
          error={faults.name}
          required
          maxLength={120}
          value={settings.name}
          onChange={(event) => set({ name: event.target.value })}
        />
        <TextField
          label="Time zone"
          error={faults.timeZone}
          hint="Such as Europe/Oslo. Times on screen and paper are in it."
          value={settings.timeZone}
          onChange={(event) => set({ timeZone: event.target.value })}
        />
        <SelectField
          label="Units"
          value={settings.units}
          onChange={(event) => set({ units: event.target.value === "inch" ? "inch" : "mm" })}
        >
          <option value="mm">Millimetres</option>
          <option value="inch">Inches</option>
        </SelectField>
        <SelectField
          label="Inches to the nearest"
          value={settings.inchFraction}
          disabled={settings.units === "mm"}
          onChange={(event) => set({ inchFraction: event.target.value === "32" ? 32 : 64 })}
        >
          <option value="32">1⁄32</option>
          <option value="64">1⁄64</option>
        </SelectField>
        <SelectField
          label="Paper"
          value={settings.paper}
          onChange={(event) => set({ paper: event.target.value === "letter" ? "letter" : "a4" })}
        >
          <option value="a4">A4</option>
          <option value="letter">US Letter</option>
        </SelectField>
        <TextField
          label="Currency"
          error={faults.currency}
          hint="Three letters, such as EUR"
          maxLength={3}
          value={settings.currency}
          onChange={(event) => set({ currency: event.target.value.toUpperCase() })}
        />
        {lengths.map(({ name, label, hint }) => (
          <LengthField
            key={name}
            label={label}
            hint={hint}
            error={faults[name]}
            required
            value={settings[name]}
            disabled={!mayEdit}
            onChange={(length) => length !== null && set({ [name]: length })}
          />
        ))}
      </fieldset>
      {save.isError && (
        <Notice kind="stop">
          {Object.keys(faults).length > 0 ? "Nothing was saved. See what is said below the fields." : messageOf(save.error)}
        </Notice>
      )}
      {mayEdit ? (
        <Button type="submit" kind="primary" className="self-start" disabled={save.isPending}>
          Save settings
        </Button>
      ) : (
        <p className="text-sm text-pencil">Only the owner of the shop changes these.</p>
      )}
    </form>
  );
}

/** What the server said of single fields. */
function fieldFaults(error: Error | null): Readonly<Partial<Record<string, string>>> {
  const fields = error instanceof FaultFromServer ? (error.fault.fields ?? {}) : {};
  return Object.fromEntries(Object.entries(fields).map(([name, says]) => [name, says[0]]));
}
