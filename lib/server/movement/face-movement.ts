/** What a face's movement is worked out from, and what is chosen for it. */
import "server-only";
import { recordHistory } from "@/db/queries/history";
import { findFaceMovement, listWoodsOnTable, saveFaceMovement } from "@/db/queries/movement";
import type { ShopId } from "@/db/shop-id";
import type { BodyOf } from "@/lib/schemas/endpoint";
import type { saveFaceMovement as endpoint, FaceMovementFacts, MovementChoices } from "@/lib/schemas/movement";
import { printTag } from "@/lib/schemas/tag";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { conflict, notFound } from "../faults";
import { ownSpecies } from "../species";
import { movementSettings } from "./settings";

const nothingChosen: MovementChoices = { surround: { kind: "none" }, around: null, woods: {} };

export async function readFaceMovement(shopId: ShopId, faceId: string): Promise<FaceMovementFacts> {
  const db = database();
  const found = await findFaceMovement(db, shopId, faceId);
  if (!found) throw notFound("face");
  const settings = await movementSettings(shopId);
  const woods = await listWoodsOnTable(db, shopId, faceId);
  return {
    choices: found.choices ?? nothingChosen,
    revision: found.revision ?? 0,
    climate: found.jobClimate ?? settings.climate,
    climateOf: found.jobClimate === null ? "shop" : "job",
    leastGap: settings.leastGap,
    moistureLimit: settings.moistureLimit,
    boards: woods.map(({ boardId, tagNumber, species, cut, moistureTenths, takenOn }) => ({
      boardId,
      tag: printTag(tagNumber),
      species,
      cut,
      reading: moistureTenths === null || takenOn === null ? null : { percent: moistureTenths / 10, takenOn },
    })),
    ownSpecies: await ownSpecies(shopId),
  };
}

export async function chooseFaceMovement(
  access: ShopAccess,
  faceId: string,
  { baseRevision, ...choices }: BodyOf<typeof endpoint>,
): Promise<FaceMovementFacts> {
  const at = new Date();
  await database().transaction(async (tx) => {
    if (!(await findFaceMovement(tx, access.shopId, faceId))) throw notFound("face");
    const change = { choices, updatedBy: access.userId, updatedAt: at };
    if (!(await saveFaceMovement(tx, access.shopId, faceId, baseRevision, change))) {
      throw conflict("Somebody else chose for this face meanwhile. It shows what they chose; repeat your change.");
    }
    const entry = { userId: access.userId, noun: "face", nounId: faceId, verb: "movement chosen", detail: choices } as const;
    await recordHistory(tx, access.shopId, entry, at);
  });
  return readFaceMovement(access.shopId, faceId);
}
