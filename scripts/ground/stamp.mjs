// Tells whether something made from files is still right, by the contents of those files.
import { createHash } from "node:crypto";
import fs from "node:fs";
import path from "node:path";

/**
 * Hash over names and contents of files and, through folders, of everything in them. What is not there counts as not there.
 * @param {string} base
 * @param {string[]} places relative to the base
 * @param {string[]} [facts] anything else the result depends on
 */
export function stampOf(base, places, facts = []) {
  const hash = createHash("sha256");
  for (const fact of facts) hash.update(`${fact}\0`);
  for (const file of places.flatMap((place) => filesIn(base, place)).sort()) {
    const contents = fs.readFileSync(path.join(base, file));
    // The length keeps the end of one file from being taken for the beginning of the next.
    hash.update(`${file}\0${contents.length}\0`).update(contents);
  }
  return hash.digest("hex");
}

/**
 * @param {string} base
 * @param {string} place
 * @returns {string[]}
 */
function filesIn(base, place) {
  const found = fs.statSync(path.join(base, place), { throwIfNoEntry: false });
  if (!found) return [];
  if (!found.isDirectory()) return [place];
  return fs.readdirSync(path.join(base, place)).flatMap((name) => filesIn(base, path.join(place, name)));
}

/**
 * @param {string} file
 * @param {string} stamp
 */
export function isStamped(file, stamp) {
  return fs.existsSync(file) && fs.readFileSync(file, "utf8") === stamp;
}
