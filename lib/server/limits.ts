/** Limits on tries, counted in the database so that every web process counts together. */
import "server-only";
import { createHash } from "node:crypto";
import { RateLimiterMySQL, RateLimiterRes } from "rate-limiter-flexible";
import { openPool } from "./database";
import { FaultError } from "./faults";

interface Limit {
  readonly points: number;
  readonly seconds: number;
}

/** Common practice, no source: generous to a person mistyping, dull for a machine guessing. */
const limits = {
  signInAccount: { points: 8, seconds: 15 * 60 },
  signInAddress: { points: 60, seconds: 15 * 60 },
  /** All callers together, where their addresses are not known. */
  signInAnybody: { points: 600, seconds: 15 * 60 },
} as const satisfies Record<string, Limit>;

export type LimitName = keyof typeof limits;

/** One for each name and process: every limiter sweeps out its old counters by a timer of its own. */
const limiters = new Map<LimitName, RateLimiterMySQL>();

function limiter(name: LimitName): RateLimiterMySQL {
  const made = limiters.get(name) ?? makeLimiter(name);
  limiters.set(name, made);
  return made;
}

function makeLimiter(name: LimitName): RateLimiterMySQL {
  const { pool, databaseName } = openPool();
  return new RateLimiterMySQL({
    // The pool below the one that answers with promises: this store asks by callback.
    storeClient: pool.pool,
    storeType: "pool",
    dbName: databaseName,
    tableName: "rate_limit",
    tableCreated: true,
    keyPrefix: name,
    points: limits[name].points,
    duration: limits[name].seconds,
  });
}

/** Keys come from outside and may be long, or an address that should not stand in a table: they are kept as a hash. */
const keyOf = (key: string): string => createHash("sha256").update(key).digest("base64url");

/** Counts one try, or refuses and says how long to wait. */
export async function countTry(name: LimitName, key: string): Promise<void> {
  try {
    await limiter(name).consume(keyOf(key));
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error;
    const minutes = Math.max(1, Math.ceil(error.msBeforeNext / 60_000));
    throw new FaultError(
      "too-many-tries",
      `Too many tries. Wait ${minutes} ${minutes === 1 ? "minute" : "minutes"} and try again.`,
    );
  }
}

/** Forgets the tries of a key that turned out to be right. */
export async function forgetTries(name: LimitName, key: string): Promise<void> {
  await limiter(name).delete(keyOf(key));
}
