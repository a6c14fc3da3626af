/**
 * Property tests try the same cases on every machine, so that a red run can be repeated and a green one means something. To look for
 * new cases: PROPERTY_SEED=random, or a number.
 */
import fc from "fast-check";

const wished = process.env.PROPERTY_SEED;
const seed = wished === "random" ? undefined : Number(wished ?? 20_261_201);

fc.configureGlobal(seed === undefined ? {} : { seed });
