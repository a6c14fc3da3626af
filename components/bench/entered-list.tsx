"use client";
/** What was entered of this revision, and what it means until the maker has issued the rest. */
import { messageOf } from "@/lib/client/fault-from-server";
import type { Order } from "@/lib/schemas/order";
import { asCutWords } from "@/lib/words/as-cut";
import { styleOf } from "@/lib/words/order-step";
import { WhoAndWhen } from "../order/who-and-when";
import { Button } from "../ui/button";
import { EffectLines } from "./effect-lines";
import type { AsCutState } from "./use-as-cut";

export function EnteredList({ order: { snapshot }, asCut }: { order: Order; asCut: AsCutState }) {
  if (asCut.asCut.length === 0) return null;
  const style = styleOf(snapshot);
  return (
    <section aria-label="As cut" className="flex flex-col gap-2 rounded-md border border-rule bg-sheet p-3">
      <EffectLines effect={asCut.effect} />
      <ul className="flex flex-col">
        {asCut.asCut.map((one) => (
          <li key={one.id} className="flex items-center gap-3 border-b border-rule py-1.5 last:border-b-0">
            <span className="min-w-0 grow">
              {asCutWords(one.entry, snapshot, style)}
              <span className="block text-sm text-pencil">
                <WhoAndWhen tick={one} />
              </span>
            </span>
            <Button
              className="min-h-11!"
              disabled={asCut.pending}
              aria-label={`Take back: ${asCutWords(one.entry, snapshot, style)}`}
              onClick={() => asCut.save({ entries: [], takenBack: [one], tick: null }).catch(() => undefined)}
            >
              Take back
            </Button>
          </li>
        ))}
      </ul>
      {asCut.error && (
        <p role="alert" className="text-crayon">
          {messageOf(asCut.error)}
        </p>
      )}
      <p className="text-sm text-pencil">The maker sees this and issues the rest around what is cut.</p>
    </section>
  );
}
