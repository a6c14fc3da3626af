/** A species of the shop's own while it is written down. */
import { type OwnSpecies, saveSpeciesSchema } from "@/lib/schemas/species";

export interface SpeciesDraft {
  /** null: new. */
  readonly id: string | null;
  readonly name: string;
  /** Apart by commas. */
  readonly alsoCalled: string;
  readonly kind: "coefficients" | "shrinkage";
  readonly radial: number | null;
  readonly tangential: number | null;
  readonly source: string;
}

export const freshSpecies: SpeciesDraft = {
  id: null,
  name: "",
  alsoCalled: "",
  kind: "shrinkage",
  radial: null,
  tangential: null,
  source: "",
};

export const speciesDraft = ({ id, name, alsoCalled, movement, source }: OwnSpecies): SpeciesDraft => ({
  id,
  name,
  alsoCalled: alsoCalled.join(", "),
  ...movement,
  source,
});

export type SpeciesErrors = Readonly<Partial<Record<"name" | "alsoCalled" | "movement" | "source", string>>>;
type Checked =
  | { readonly ok: true; readonly fields: Omit<OwnSpecies, "id"> }
  | { readonly ok: false; readonly errors: SpeciesErrors };

/** By the rules of the wire, with what is wrong below each field. */
export function checkSpecies({ name, alsoCalled, kind, radial, tangential, source }: SpeciesDraft): Checked {
  const names = alsoCalled
    .split(",")
    .map((one) => one.trim())
    .filter((one) => one !== "");
  if (radial === null || tangential === null) return { ok: false, errors: { movement: "Enter both figures" } };
  const parsed = saveSpeciesSchema.safeParse({ name, alsoCalled: names, movement: { kind, radial, tangential }, source });
  if (parsed.success) return { ok: true, fields: parsed.data };
  const first = (field: string) => parsed.error.issues.find(({ path }) => path[0] === field)?.message;
  return {
    ok: false,
    errors: Object.fromEntries((["name", "alsoCalled", "movement", "source"] as const).map((field) => [field, first(field)])),
  };
}
