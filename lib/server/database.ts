/** This process' pool of connections. */
import "server-only";
import { type Database, type OpenDatabase, openDatabase } from "@/db/client";
import { env } from "./env";

// Kept on globalThis because `next dev` loads this module anew after every edit.
const held = globalThis as typeof globalThis & { grainwrightDatabase?: OpenDatabase };

export function openPool(): OpenDatabase {
  held.grainwrightDatabase ??= openDatabase(env().DATABASE_URL);
  return held.grainwrightDatabase;
}

export function database(): Database {
  return openPool().db;
}
