/** What stands in place of the steps once the revision no longer holds. */
import Link from "next/link";
import type { Order } from "@/lib/schemas/order";
import { revisionLetter } from "@/lib/words/revision-letter";
import { supersededWhy } from "@/lib/words/superseded";
import { buttonClass } from "../ui/button";

export function SupersededStop({ order, newestRevision }: { order: Order; newestRevision: number }) {
  const newer = newestRevision > order.revision;
  return (
    <main className="mx-auto flex w-full max-w-3xl grow flex-col gap-4 p-4" role="alert">
      <div className="rounded-sm border-l-8 border-crayon bg-crayon-wash p-4">
        <h1 className="text-2xl text-crayon">Stop: revision {revisionLetter(order.revision)} is superseded</h1>
        <p className="mt-2 text-lg">Cut nothing more from this revision, on screen or on paper: {supersededWhy}.</p>
      </div>
      {newer ? (
        // A whole new page: everything of the old revision is gone from the screen.
        <a href={`/bench/${order.id}`} className={`${buttonClass("primary")} min-h-16! text-xl!`}>
          Go on with revision {revisionLetter(newestRevision)}
        </a>
      ) : (
        <p className="text-lg">
          No newer revision is issued yet. Ask the maker; this page shows the new one as soon as it is there.
        </p>
      )}
      <Link href={`/orders/${order.id}`} className={buttonClass("plain")}>
        See the order
      </Link>
    </main>
  );
}
