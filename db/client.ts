/** The one pool of connections to MariaDB, and the types queries take so that a transaction fits everywhere. */
import "server-only";
import { drizzle, type MySql2Database } from "drizzle-orm/mysql2";
import mysql, { type Pool } from "mysql2/promise";
import * as schema from "./schema";

export type Database = MySql2Database<typeof schema>;
type Transaction = Parameters<Parameters<Database["transaction"]>[0]>[0];
/** First argument of every query: the database or an open transaction. */
export type Connection = Database | Transaction;

export interface OpenDatabase {
  readonly db: Database;
  readonly pool: Pool;
  /** The name at the end of the address. */
  readonly databaseName: string;
}

/**
 * Requests that may wait for a connection at once. Beyond it the database is not keeping up, or something holds its connections: an
 * error that says so beats a server that hangs.
 */
const longestQueue = 200;

/** Opens a pool. Times are UTC on the wire; `planetscale` mode because MariaDB has no LATERAL joins. */
export function openDatabase(url: string, connectionLimit = 10): OpenDatabase {
  const pool = mysql.createPool({
    uri: url,
    connectionLimit,
    queueLimit: longestQueue,
    timezone: "Z",
    charset: "utf8mb4",
    supportBigNumbers: true,
    decimalNumbers: true,
  });
  // Without gap locks: under REPEATABLE READ a locking read that finds nothing (no order of this face yet) keeps others from
  // inserting theirs, and two that issue at once lock each other out. Rows that must not change meanwhile are locked by name.
  pool.on("connection", (connection) => connection.query("SET SESSION TRANSACTION ISOLATION LEVEL READ COMMITTED"));
  return { db: drizzle(pool, { schema, mode: "planetscale" }), pool, databaseName: new URL(url).pathname.slice(1) };
}
