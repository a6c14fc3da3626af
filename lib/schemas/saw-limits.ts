/** What a saw may take in hand, as the shop says of it, and what is usual for each kind. */
import { z } from "zod";
import { type MachineKind, type MachineLimits, um, umFromMm } from "@/lib/layout";
import { sizeUmSchema } from "./length";

export const sawKinds = ["table", "track", "band", "hand"] as const satisfies readonly MachineKind[];

/** 0 to 30 m. */
const leastSchema = z.int().min(0).max(30_000_000).transform(um).meta({ description: "micrometres, 0 for no limit" });

export const sawLimitsSchema = z.object({
  rips: z.boolean(),
  crosscuts: z.boolean(),
  /** Between fence and blade; null: as wide as it comes. */
  widestRip: sizeUmSchema.nullable(),
  /** The widest part it crosscuts; null: as wide as it comes. */
  longestCrosscut: sizeUmSchema.nullable(),
  /** Of the part in hand before the cut. */
  shortest: leastSchema,
  narrowest: leastSchema,
});

/**
 * Where a shop has said nothing yet. Common practice, no source: a short part comes too near to the blade of a saw table; a track wants
 * something to lie on; a band saw has no room beside its blade for long parts across; a fine hand saw is made for crosscuts.
 */
export const usualLimits: Readonly<Record<MachineKind, MachineLimits>> = {
  table: {
    rips: true,
    crosscuts: true,
    widestRip: null,
    longestCrosscut: null,
    shortest: umFromMm(150),
    narrowest: umFromMm(10),
  },
  track: {
    rips: true,
    crosscuts: true,
    widestRip: null,
    longestCrosscut: null,
    shortest: umFromMm(300),
    narrowest: umFromMm(150),
  },
  band: {
    rips: true,
    crosscuts: false,
    widestRip: umFromMm(300),
    longestCrosscut: null,
    shortest: umFromMm(100),
    narrowest: um(0),
  },
  hand: { rips: false, crosscuts: true, widestRip: null, longestCrosscut: null, shortest: um(0), narrowest: um(0) },
};
