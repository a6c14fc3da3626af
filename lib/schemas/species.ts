/** The shop's own species, with how they move and where that is known from. */
import { z } from "zod";
import type { Species } from "@/lib/layout";
import { defineEndpoint, everyone, makers } from "./endpoint";
import { idSchema } from "./ids";

/** Wide enough for every wood; so that a figure typed ten times too large is noticed. Common practice, no source. */
const coefficientSchema = z.number().min(0.0002, "At least .0002").max(0.01, "At most .01");
const shrinkageSchema = z.number().min(0.5, "At least 0.5 %").max(20, "At most 20 %");

const swapped = "Wood moves more along its growth rings than out from the pith: the tangential figure is the larger one";
export const woodMovementSchema = z
  .discriminatedUnion("kind", [
    z.object({ kind: z.literal("coefficients"), radial: coefficientSchema, tangential: coefficientSchema }),
    z.object({ kind: z.literal("shrinkage"), radial: shrinkageSchema, tangential: shrinkageSchema }),
  ])
  .refine(({ radial, tangential }) => radial <= tangential, { message: swapped });

export const saveSpeciesSchema = z.object({
  name: z.string().trim().min(1, "Name the species").max(80),
  /** Other names that boards are written down under. */
  alsoCalled: z.array(z.string().trim().min(1).max(80)).max(12),
  movement: woodMovementSchema,
  /** Where the figures are from: a book and its page, a test of one's own. */
  source: z.string().trim().min(3, "Say where the figures are from, such as a book and its page").max(300),
});

export const ownSpeciesSchema = saveSpeciesSchema.extend({ id: idSchema });
export type OwnSpecies = z.output<typeof ownSpeciesSchema>;

/** As the core takes it. */
export const speciesOf = ({ id, name, alsoCalled, movement, source }: OwnSpecies): Species => ({
  key: id,
  name,
  alsoCalled,
  movement,
  source: { kind: "shop", text: source },
});

/** More than any shop works with; the list goes out whole. */
export const MOST_SPECIES = 200;

export const listSpecies = defineEndpoint({
  method: "GET",
  path: "/api/species",
  summary: `The shop's own species, at most ${MOST_SPECIES}; the published ones are part of the program`,
  tag: "species",
  access: everyone,
  response: z.object({ items: z.array(ownSpeciesSchema) }),
});

export const createSpecies = defineEndpoint({
  method: "POST",
  path: "/api/species",
  summary: "Add a species with its source",
  tag: "species",
  access: makers,
  body: saveSpeciesSchema,
  response: ownSpeciesSchema,
});

const params = z.object({ speciesId: idSchema });

export const updateSpecies = defineEndpoint({
  method: "PUT",
  path: "/api/species/{speciesId}",
  summary: "Change a species of the shop's own; faces that use it follow",
  tag: "species",
  access: makers,
  params,
  body: saveSpeciesSchema,
  response: ownSpeciesSchema,
});

export const deleteSpecies = defineEndpoint({
  method: "DELETE",
  path: "/api/species/{speciesId}",
  summary: "Remove a species of the shop's own; faces that use it ask for another",
  tag: "species",
  access: makers,
  params,
  response: null,
});
