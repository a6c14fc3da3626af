/** Puts the demo into an empty database, once; the lines it writes to the standard output say how to sign in. Progress goes to the other. */
import { count, eq } from "drizzle-orm";
import type { RowDataPacket } from "mysql2";
import type { Database } from "@/db/client";
import { shop, user } from "@/db/schema";
import { openPool } from "@/lib/server/database";
import { closePlanPool } from "@/lib/server/orders/plan-pool";
import { closePixelPool } from "@/lib/server/pictures/pixel-pool";
import { makeDemo } from "./demo/make-demo";
import { demoPassword, demoPeople } from "./demo/people";
import { hirePhotographers } from "./demo/photographers";
import { removeUnfinished } from "./demo/unfinished";

// The log goes to the standard output as well, where it would stand between the sign-ins: a failure is thrown and says what it was.
process.env.LOG_LEVEL = "silent";

const say = (line: string) => process.stderr.write(`${line}\n`);

const { db, pool } = openPool();
// A second start on the same database must not take a demo in the making for one that was broken off. Held by this connection only.
const guard = await pool.getConnection();
try {
  const [rows] = await guard.query<RowDataPacket[]>("select get_lock('grainwright demo', 600) as held");
  if (rows[0]?.held !== 1) throw new Error("Another start has been making the demo for ten minutes. End it, then start again.");
  await seed(db);
  for (const { role, email } of demoPeople) {
    const [found] = await db.select({ id: user.id }).from(user).where(eq(user.email, email));
    if (found) process.stdout.write(`Sign in as ${role}: ${email}, password ${demoPassword}\n`);
  }
} finally {
  guard.destroy();
  await closePixelPool();
  await closePlanPool();
  await pool.end();
}

async function seed(db: Database): Promise<void> {
  if ((await removeUnfinished(db)) > 0) say("The demo was not finished last time; making it anew.");
  const [shops] = await db.select({ count: count() }).from(shop);
  if (shops?.count !== 0) return;
  say("Making the demo (about a minute, once).");
  const photographers = hirePhotographers();
  try {
    await makeDemo({ db, now: new Date(), takePhoto: photographers.take, photoScale: 1, say });
  } finally {
    await photographers.dismiss();
  }
}
