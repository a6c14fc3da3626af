/** The shop's own species. */
import "server-only";
import type { z } from "zod";
import { isDuplicateKey } from "@/db/duplicate-key";
import { recordHistory } from "@/db/queries/history";
import { countSpecies, deleteSpecies, findSpecies, insertSpecies, listSpecies, updateSpecies } from "@/db/queries/species";
import type { ShopId } from "@/db/shop-id";
import { MOST_SPECIES, type OwnSpecies, type saveSpeciesSchema } from "@/lib/schemas/species";
import type { ShopAccess } from "./access";
import { database } from "./database";
import { notFound, refused } from "./faults";

type Fields = z.output<typeof saveSpeciesSchema>;

export async function ownSpecies(shopId: ShopId): Promise<OwnSpecies[]> {
  const rows = await listSpecies(database(), shopId, MOST_SPECIES);
  return rows.map(({ id, name, alsoCalled, movement, source }) => ({ id, name, alsoCalled, movement, source }));
}

export async function addSpecies(access: ShopAccess, fields: Fields): Promise<OwnSpecies> {
  const id = await unlessNameTaken(fields.name, () =>
    database().transaction(async (tx) => {
      if ((await countSpecies(tx, access.shopId)) >= MOST_SPECIES) {
        throw refused(`A shop has at most ${MOST_SPECIES} species of its own. Remove one first.`);
      }
      const speciesId = await insertSpecies(tx, access.shopId, fields);
      const entry = { userId: access.userId, noun: "species", nounId: speciesId, verb: "added", detail: fields } as const;
      await recordHistory(tx, access.shopId, entry, new Date());
      return speciesId;
    }),
  );
  return { id, ...fields };
}

export async function changeSpecies(access: ShopAccess, speciesId: string, fields: Fields): Promise<OwnSpecies> {
  await unlessNameTaken(fields.name, () =>
    database().transaction(async (tx) => {
      const found = await findSpecies(tx, access.shopId, speciesId);
      if (!found) throw notFound("species");
      const { name, movement, source } = found;
      await updateSpecies(tx, access.shopId, speciesId, fields);
      const detail = { before: { name, movement, source }, after: fields };
      const entry = { userId: access.userId, noun: "species", nounId: speciesId, verb: "changed", detail } as const;
      await recordHistory(tx, access.shopId, entry, new Date());
    }),
  );
  return { id: speciesId, ...fields };
}

export async function removeSpecies(access: ShopAccess, speciesId: string): Promise<void> {
  await database().transaction(async (tx) => {
    const found = await findSpecies(tx, access.shopId, speciesId);
    if (!found) throw notFound("species");
    await deleteSpecies(tx, access.shopId, speciesId);
    const { name, movement, source } = found;
    const entry = {
      userId: access.userId,
      noun: "species",
      nounId: speciesId,
      verb: "removed",
      detail: { name, movement, source },
    } as const;
    await recordHistory(tx, access.shopId, entry, new Date());
  });
}

/** The unique key decides, so that two people who choose the same name at once get one species and one refusal. */
async function unlessNameTaken<T>(name: string, write: () => Promise<T>): Promise<T> {
  try {
    return await write();
  } catch (error) {
    if (isDuplicateKey(error)) throw refused(`There is a species called ${name} already.`, { name: ["Taken already"] });
    throw error;
  }
}
