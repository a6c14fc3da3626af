/** Seeds the demo shop into an empty database, once. Says how to sign in to it, every time it is there. */
import { count, eq } from "drizzle-orm";
import { openDatabase } from "@/db/client";
import { shop, user } from "@/db/schema";
import { env } from "@/lib/server/env";
import { demoPassword, demoPeople, seedPeople } from "./demo/people";

const { db, pool } = openDatabase(env().DATABASE_URL, 2);
try {
  const [shops] = await db.select({ count: count() }).from(shop);
  if (shops?.count === 0) await db.transaction(async (tx) => seedPeople(tx, new Date()));
  for (const { role, email } of demoPeople) {
    const [found] = await db.select({ id: user.id }).from(user).where(eq(user.email, email));
    if (found) process.stdout.write(`Sign in as ${role}: ${email}, password ${demoPassword}\n`);
  }
} finally {
  await pool.end();
}
