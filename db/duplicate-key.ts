/** Telling a unique key's refusal from every other error of the database. */
import "server-only";

/** True when a row with the same unique key is there already. The query builder wraps the driver's error. */
export function isDuplicateKey(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  if ("code" in error && error.code === "ER_DUP_ENTRY") return true;
  return error.cause instanceof Error && isDuplicateKey(error.cause);
}
