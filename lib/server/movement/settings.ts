/** Where a shop's furniture lives, its least gap and how far moistures may differ. */
import "server-only";
import { recordHistory } from "@/db/queries/history";
import { readShopMovement, saveShopMovement } from "@/db/queries/movement";
import type { ShopId } from "@/db/shop-id";
import { defaultClimate, umFromMm } from "@/lib/layout";
import type { BodyOf } from "@/lib/schemas/endpoint";
import type { updateMovementSettings as endpoint, MovementSettings } from "@/lib/schemas/movement";
import type { ShopAccess } from "../access";
import { tenthsOf } from "../boards/tenths";
import { database } from "../database";
import { conflict } from "../faults";

/** The least gap and the difference in moisture: common practice, no source. */
const start: Omit<MovementSettings, "climate"> = { leastGap: umFromMm(1.5), moistureLimit: 2, revision: 0 };

export async function movementSettings(shopId: ShopId): Promise<MovementSettings> {
  const row = await readShopMovement(database(), shopId);
  if (!row) return { ...start, climate: { ...defaultClimate } };
  const { climate, leastGap, moistureLimitTenths, revision } = row;
  return { climate, leastGap, moistureLimit: moistureLimitTenths / 10, revision };
}

export async function saveMovementSettings(access: ShopAccess, body: BodyOf<typeof endpoint>): Promise<MovementSettings> {
  const { baseRevision, climate, leastGap, moistureLimit } = body;
  await database().transaction(async (tx) => {
    const fields = { climate, leastGap, moistureLimitTenths: tenthsOf(moistureLimit) };
    if (!(await saveShopMovement(tx, access.shopId, baseRevision, fields))) {
      throw conflict("Somebody else saved the movement settings meanwhile. Load them again and repeat your change.");
    }
    const detail = { climate, leastGap, moistureLimit };
    const entry = { userId: access.userId, noun: "shop", nounId: access.shopId, verb: "movement changed", detail } as const;
    await recordHistory(tx, access.shopId, entry, new Date());
  });
  return movementSettings(access.shopId);
}
