"use client";
/** A cut as it was really made: the true kerf, the true sizes of what came off, and at once what that comes to. */
import { useState } from "react";
import { messageOf } from "@/lib/client/fault-from-server";
import type { KerfReach, Um } from "@/lib/layout";
import type { Order } from "@/lib/schemas/order";
import type { OrderStep } from "@/lib/schemas/order-steps";
import { buttonClass } from "../ui/button";
import { Choice } from "../ui/choice";
import { Modal } from "../ui/modal";
import { changeOf, draftOf, kerfAsked, sizesAsked } from "./as-cut-draft";
import { EffectLines } from "./effect-lines";
import { TrueLength } from "./true-length";
import type { AsCutState } from "./use-as-cut";

interface Props {
  order: Order;
  step: OrderStep;
  ticked: boolean;
  asCut: AsCutState;
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

const reaches: readonly { readonly value: KerfReach; readonly label: string }[] = [
  { value: "on", label: "From here on" },
  { value: "all", label: "Every cut" },
  { value: "only", label: "Here only" },
];

export function AsCutSheet({ open, onOpenChange, ...rest }: Props) {
  return (
    <Modal open={open} onOpenChange={onOpenChange} title={`As cut: step ${rest.step.number}`}>
      {open && <AsCutForm {...rest} onDone={() => onOpenChange(false)} />}
    </Modal>
  );
}

function AsCutForm({ order, step, ticked, asCut, onDone }: Omit<Props, "open" | "onOpenChange"> & { onDone: () => void }) {
  const { snapshot } = order;
  const [draft, setDraft] = useState(() => draftOf(step, snapshot, asCut.asCut));
  const planned = kerfAsked(step, snapshot);
  const change = changeOf(step, snapshot, asCut.asCut, draft, ticked);
  const nothing = change.entries.length === 0 && change.takenBack.length === 0;
  const effect = asCut.effectWith(change.entries, change.takenBack, change.tick);
  const setSize = (key: string, size: Um) => setDraft((now) => ({ ...now, sizes: { ...now.sizes, [key]: size } }));
  return (
    <form
      className="flex flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        asCut.save(change).then(onDone, () => undefined);
      }}
    >
      {draft.kerf !== null && planned !== null && (
        <>
          <TrueLength
            label="True kerf"
            planned={planned}
            value={draft.kerf}
            onChange={(kerf) => setDraft((now) => ({ ...now, kerf }))}
          />
          {step.kind === "cut" && draft.kerf !== planned && (
            <Choice
              legend="It holds"
              value={draft.reach}
              options={reaches}
              onChange={(reach) => setDraft((now) => ({ ...now, reach }))}
            />
          )}
        </>
      )}
      {sizesAsked(step).map((asked) => (
        <TrueLength
          key={asked.key}
          label={asked.label}
          planned={asked.planned}
          value={draft.sizes[asked.key] ?? asked.planned}
          onChange={(size) => setSize(asked.key, size)}
        />
      ))}
      {!nothing && <EffectLines effect={effect} />}
      {asCut.error && (
        <p role="alert" className="text-crayon">
          {messageOf(asCut.error)}
        </p>
      )}
      <button
        type="submit"
        className={`${buttonClass("primary")} min-h-14! text-lg!`}
        disabled={nothing || effect.faults.length > 0 || asCut.pending}
      >
        {asCut.pending ? "Saving…" : change.tick === null ? "Save" : "Cut, and save"}
      </button>
    </form>
  );
}
