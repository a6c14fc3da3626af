/** Column kinds used by every table, so that a length is never stored in two ways. */
import { char, customType, datetime, int } from "drizzle-orm/mysql-core";
import type { z } from "zod";
import { type Um, um } from "@/lib/layout";

/** A UUID (version 7, made by the application: they sort by time, so inserts stay at the end of the index). */
export const idColumn = (name: string) => char(name, { length: 36 });

/** A length in whole micrometres. INT reaches ±2147 m. */
export const umColumn = customType<{ data: Um; driverData: number }>({
  dataType: () => "int",
  fromDriver: (value) => um(Number(value)),
});

/** A moment in UTC, to the millisecond. The connection's time zone is fixed to UTC. */
export const utcColumn = (name: string) => datetime(name, { mode: "date", fsp: 3 });

/** Money in minor units (pence, cents). */
export const minorUnitsColumn = (name: string) => int(name);

/**
 * A JSON document with its schema. MariaDB's JSON is LONGTEXT and drivers hand it over as text or as an object, so both are
 * taken; what does not fit the schema is a fault of ours and throws.
 */
export function jsonOf<S extends z.ZodType>(schema: S) {
  return customType<{ data: z.output<S>; driverData: string }>({
    dataType: () => "json",
    toDriver: (value) => JSON.stringify(value),
    fromDriver: (value) => schema.parse(typeof value === "string" ? JSON.parse(value) : value),
  });
}
