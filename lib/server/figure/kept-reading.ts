/** Something read from a finished picture once and kept beside it: the picture never changes, so neither does what it says. */
import "server-only";
import type { z } from "zod";
import { findStraightening } from "@/db/queries/straightening";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound, refused } from "../faults";
import { storage } from "../storage";
import { straighteningFileKey } from "../straightenings/straightening-files";
import type { StoredPicture } from "./figure-job";
import { figureLevel } from "./figure-level";

export interface KeptReading<Schema extends z.ZodType> {
  readonly schema: Schema;
  /** Of the file. With a number that is raised when the reading is made another way, so that what was kept before is not found. */
  readonly name: string;
  readonly read: (picture: StoredPicture) => Promise<z.input<Schema>>;
}

export async function keptReading<Schema extends z.ZodType>(
  access: ShopAccess,
  straighteningId: string,
  { schema, name, read }: KeptReading<Schema>,
): Promise<z.input<Schema>> {
  const row = await findStraightening(database(), access.shopId, straighteningId);
  if (!row) throw notFound("picture");
  const level = figureLevel(row);
  if (level === null) throw refused("This picture is not straightened yet. Ask again when it is done.");
  const key = straighteningFileKey(access.shopId, straighteningId, name);
  const kept = await storage().get(key);
  if (kept) return JSON.parse(new TextDecoder().decode(kept)) as z.input<Schema>;
  const reading = await read(level);
  schema.parse(reading);
  await storage().put(key, new TextEncoder().encode(JSON.stringify(reading)));
  return reading;
}
