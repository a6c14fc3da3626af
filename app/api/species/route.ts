import { createSpecies, listSpecies } from "@/lib/schemas/species";
import { handle } from "@/lib/server/http/handle";
import { addSpecies, ownSpecies } from "@/lib/server/species";

export const GET = handle(listSpecies, async ({ access }) => ({ items: await ownSpecies(access.shopId) }));
export const POST = handle(createSpecies, async ({ access, body }) => addSpecies(access, body));
