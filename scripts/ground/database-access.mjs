// The names and passwords of the project's own database servers, made once and kept readable by this user alone.
import { randomBytes } from "node:crypto";
import fs from "node:fs";
import { inData } from "./project.mjs";

/** @typedef {{ user: string, password: string, rootPassword: string }} Access */

/**
 * @param {string} store
 * @returns {Access}
 */
export function readAccess(store) {
  const file = inData(`${store}.access.json`);
  if (!fs.existsSync(file)) {
    const access = { user: "grainwright", password: newSecret(), rootPassword: newSecret() };
    fs.writeFileSync(file, JSON.stringify(access), { mode: 0o600 });
  }
  return JSON.parse(fs.readFileSync(file, "utf8"));
}

/** 256 random bits in letters that need no quoting in SQL or a URL. */
export function newSecret() {
  return randomBytes(32).toString("base64url");
}
