import { deleteSpecies, updateSpecies } from "@/lib/schemas/species";
import { handle } from "@/lib/server/http/handle";
import { changeSpecies, removeSpecies } from "@/lib/server/species";

export const PUT = handle(updateSpecies, async ({ access, body, params }) => changeSpecies(access, params.speciesId, body));
export const DELETE = handle(deleteSpecies, async ({ access, params }) => {
  await removeSpecies(access, params.speciesId);
  return null;
});
