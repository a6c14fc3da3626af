/** The grain of a board's picture. Read when first asked for and kept beside the picture, which never changes. */
import "server-only";
import type { z } from "zod";
import { findStraightening } from "@/db/queries/straightening";
import { type GrainOnWire, type getGrain, grainFieldSchema } from "@/lib/schemas/figure";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound, refused } from "../faults";
import { storage } from "../storage";
import { straighteningFileKey } from "../straightenings/straightening-files";
import { figureLevel } from "./figure-level";
import { readFigure } from "./figure-pool";

export async function grainOf(
  access: ShopAccess,
  straighteningId: string,
  signal: AbortSignal,
): Promise<z.input<typeof getGrain.response>> {
  const row = await findStraightening(database(), access.shopId, straighteningId);
  if (!row) throw notFound("picture");
  const level = figureLevel(row);
  if (level === null) throw refused("This picture is not straightened yet. Ask again when it is done.");
  const key = straighteningFileKey(access.shopId, straighteningId, "grain-1.json");
  const kept = await storage().get(key);
  if (kept) return grainFieldSchema.parse(JSON.parse(new TextDecoder().decode(kept)));
  const { cellMm, columns, rows, direction, coherence } = await readFigure("readGrain", level, signal);
  const grain: GrainOnWire = {
    cellMm,
    columns,
    rows,
    // A tenth of a degree and a hundredth: finer than what is read, and a third of the bytes.
    directionDeg: Array.from(direction, (radians) => Math.round((radians * 1800) / Math.PI) / 10),
    coherence: Array.from(coherence, (share) => Math.round(share * 100) / 100),
  };
  await storage().put(key, new TextEncoder().encode(JSON.stringify(grain)));
  return grain;
}
