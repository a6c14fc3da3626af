/** Whether this process can do its work. */
import "server-only";
import { sql } from "drizzle-orm";
import { database } from "./database";

/** Throws when the database does not answer. */
export async function checkHealth(): Promise<void> {
  await database().execute(sql`select 1`);
}
