/** `npm run worker`: works off tasks on this machine until it is asked to end. */
import { openPool } from "@/lib/server/database";
import { startWorking } from "@/lib/server/tasks/start";

await startWorking();
await openPool().pool.end();
