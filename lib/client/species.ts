/** The shop's own species, from the browser. */
import { queryOptions } from "@tanstack/react-query";
import type { BodySent } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/species";
import { call } from "./call";

export const speciesKey = ["species"] as const;

export const speciesQuery = () =>
  queryOptions({ queryKey: speciesKey, queryFn: ({ signal }) => call(endpoint.listSpecies, {}, signal) });

export const createSpecies = (body: BodySent<typeof endpoint.createSpecies>) => call(endpoint.createSpecies, { body });

export const updateSpecies = (speciesId: string, body: BodySent<typeof endpoint.updateSpecies>) =>
  call(endpoint.updateSpecies, { params: { speciesId }, body });

export const deleteSpecies = (speciesId: string) => call(endpoint.deleteSpecies, { params: { speciesId } });
