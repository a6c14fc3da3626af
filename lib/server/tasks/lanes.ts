/** Which long work waits for which: the kinds of one lane share its places, so that an hour of searching holds up no picture. */
import "server-only";
import type { taskKinds } from "@/lib/schemas/task";
import { env } from "../env";

type Kind = (typeof taskKinds)[number];
type Lane = "pictures" | "searches";

const laneOf: Readonly<Record<Kind, Lane>> = { straighten: "pictures", compose: "pictures", search: "searches" };

/** Tasks of a lane that one process works off at once: as many pictures as there are threads for them, and one search, which has threads enough of its own. */
export function placesOf(): Readonly<Record<Lane, number>> {
  return { pictures: env().PIXEL_THREADS, searches: 1 };
}

/** The kinds of a lane out of these. */
export function inLane<Value>(kinds: Readonly<Record<Kind, Value>>, lane: Lane): Partial<Record<Kind, Value>> {
  return Object.fromEntries(Object.entries(kinds).filter(([kind]) => laneOf[kind as Kind] === lane));
}

export const lanes: readonly Lane[] = ["pictures", "searches"];
