"use client";
/** What a revision goes on from: what was cut before it, what the bench had found, and what was done about it. */
import type { Order } from "@/lib/schemas/order";
import { alreadyCut } from "@/lib/words/already-cut";
import { styleOf } from "@/lib/words/order-step";
import { troubleSentence } from "@/lib/words/rest";
import { revisionLetter } from "@/lib/words/revision-letter";
import { WhoAndWhen } from "./who-and-when";

export function RestRecord({ order: { snapshot } }: { order: Order }) {
  const { rest } = snapshot;
  if (!rest) return null;
  const style = styleOf(snapshot);
  return (
    <section aria-label="Already cut" className="rounded-md border border-rule bg-sheet p-4">
      <h2 className="mb-1 text-lg">Goes on from revision {revisionLetter(rest.revision)}</h2>
      {alreadyCut(snapshot).map((line) => (
        <p key={line}>{line}</p>
      ))}
      {rest.entries.length > 0 && (
        <ul className="mt-2 border-t border-rule text-sm">
          {rest.entries.map((one) => (
            <li key={one.id} className="border-b border-rule py-1.5">
              {one.words}{" "}
              <span className="text-pencil">
                (<WhoAndWhen tick={one} />)
              </span>
            </li>
          ))}
        </ul>
      )}
      {rest.troubles.map(({ boardId, trouble }) => (
        <p key={`${boardId} ${trouble.key}`} className="mt-2 text-sm">
          {troubleSentence(trouble, style)}
        </p>
      ))}
    </section>
  );
}
