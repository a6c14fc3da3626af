/** Lengths on the wire: whole micrometres. */
import { z } from "zod";
import { um } from "@/lib/layout";

/** Any signed length or coordinate, µm. INT columns hold ±2147 m; no stock comes near. */
export const umSchema = z.int().min(-2_000_000_000).max(2_000_000_000).transform(um).meta({ description: "micrometres" });

/** A size: more than nothing, at most 30 m. */
export const sizeUmSchema = z.int().min(1).max(30_000_000).transform(um).meta({ description: "micrometres, above 0" });

/** A gap, a kerf, a clean-up: 0 to 200 mm. */
export const allowanceUmSchema = z.int().min(0).max(200_000).transform(um).meta({ description: "micrometres, 0 to 200 mm" });

export const pointSchema = z.object({ x: umSchema, y: umSchema });
export const rectSchema = z.object({ x: umSchema, y: umSchema, width: umSchema, height: umSchema });
