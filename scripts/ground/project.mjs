// Where things lie in the project. Everything made at run time stays under .data, uploads and the build folders.
import { createHash } from "node:crypto";
import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { Refusal } from "./say.mjs";

/** The project's folder with symbolic links resolved, so that one folder has one name. */
export const root = fs.realpathSync(fileURLToPath(new URL("../..", import.meta.url)));

/** @param {...string} parts */
export function inProject(...parts) {
  return path.join(root, ...parts);
}

/** @param {...string} parts */
export function inData(...parts) {
  return inProject(".data", ...parts);
}

/** Names this user's use of this folder. A copy of the project carries .data along, but its records name another place and are not believed. */
const place = createHash("sha256").update(`${process.getuid?.()}:${root}`).digest("hex").slice(0, 16);

/**
 * A file about what is running now: locks, ports, process numbers.
 * @param {...string} parts
 */
export function inRun(...parts) {
  fs.mkdirSync(inData("run", place), { recursive: true });
  return inData("run", place, ...parts);
}

/**
 * The path for a socket, in a folder only this user can enter. It lies in the temporary folder because such a path may be 107 bytes
 * long at most (sun_path in unix(7)), and a project folder may be deep.
 * @param {string} name
 */
export function socketPath(name) {
  const folder = path.join(os.tmpdir(), `grainwright-${place}`);
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  // The name can be guessed and the temporary folder is everybody's: somebody else may have been first, or left a link to elsewhere.
  const found = fs.lstatSync(folder);
  if (!found.isDirectory() || found.uid !== process.getuid?.() || (found.mode & 0o077) !== 0) {
    throw new Refusal(`${folder} is not a private folder of this user.`, "Remove it, or set TMPDIR to a folder of your own.");
  }
  return path.join(folder, `${name}.sock`);
}

/**
 * Makes the folder for run-time data, or says whose folder stands in the way: a run as root leaves files an ordinary user cannot write.
 */
export function prepareDataFolder() {
  try {
    fs.accessSync(root, fs.constants.W_OK);
    fs.mkdirSync(inData(), { recursive: true });
    fs.accessSync(inData(), fs.constants.W_OK);
  } catch (cause) {
    if (!(cause instanceof Error)) throw cause;
    throw new Refusal(
      `The project folder ${root} cannot be written by this user (${cause.message}).`,
      `Copy the project to a folder of your own, or give it back to yourself: sudo chown -R "$USER" '${root}'`,
    );
  }
}
