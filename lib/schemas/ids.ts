/** Identifiers on the wire: UUIDs made by the application. */
import { z } from "zod";

export const idSchema = z.uuid().meta({ description: "UUID, version 7" });
