/** The fingerprint of what was issued, printed in short on every page: two papers with one fingerprint say the same. */
import "server-only";
import { createHash } from "node:crypto";
import { type OrderSnapshot, orderSnapshotSchema } from "@/lib/schemas/order-snapshot";

/** SHA-256 in hexadecimal of the snapshot's JSON, with its fields in the order of the schema. */
export function fingerprintOf(snapshot: OrderSnapshot): string {
  return createHash("sha256")
    .update(JSON.stringify(orderSnapshotSchema.parse(snapshot)))
    .digest("hex");
}
