import Link from "next/link";
import type { Order } from "@/lib/schemas/order";
import { revisionLetter } from "@/lib/words/revision-letter";
import { ShopDate } from "./shop-date";

/** Every revision of the order; old ones stay readable. */
export function OrderRevisions({ order }: { order: Order }) {
  return (
    <section>
      <h2 className="mb-2 text-lg">Revisions</h2>
      <ul className="border-t border-rule">
        {order.revisions.map(({ id, revision, issuedAt, issuedBy, supersededAt }) => (
          <li key={id} className={`border-b border-rule px-1 py-2 text-sm ${id === order.revisionId ? "bg-tape-wash" : ""}`}>
            <Link href={`/orders/${order.id}?revision=${revision}`} className="font-semibold text-chalk underline">
              {revisionLetter(revision)}
            </Link>{" "}
            issued <ShopDate at={issuedAt} /> by {issuedBy}
            {supersededAt && (
              <span className="block text-crayon">
                superseded <ShopDate at={supersededAt} />
              </span>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}
