// Puts together the environment the product runs in: what the shell says first, then the file .env, then what the ground provides.
// Meanings and checks live in lib/server/env.ts; here nothing is judged.
import fs from "node:fs";
import util from "node:util";
import { newSecret } from "./database-access.mjs";
import { inData, inProject } from "./project.mjs";

/** @typedef {Record<string, string | undefined>} Settings variables by name */

/**
 * The shell's environment over the one in .env, as Next.js itself reads it.
 * @returns {Settings}
 */
export function givenSettings() {
  const file = inProject(".env");
  const written = fs.existsSync(file) ? util.parseEnv(fs.readFileSync(file, "utf8")) : {};
  return mergeSettings(written, process.env);
}

/**
 * Later ones win, except that an empty value counts as not set, as an untouched line of .env.example is.
 * @param {...Settings} layers
 * @returns {Settings}
 */
export function mergeSettings(...layers) {
  /** @type {Settings} */
  const merged = {};
  for (const layer of layers) {
    for (const [name, value] of Object.entries(layer)) {
      if (value !== undefined && value !== "") merged[name] = value;
    }
  }
  return merged;
}

/** The session secret of this copy of the project, made once. */
export function keptSecret() {
  const file = inData("secret");
  if (!fs.existsSync(file)) fs.writeFileSync(file, newSecret(), { mode: 0o600 });
  return fs.readFileSync(file, "utf8");
}
