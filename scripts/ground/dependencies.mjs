// Sees that node_modules is what package-lock.json says, and runs `npm ci` when it is not.
import { spawnSync } from "node:child_process";
import fs from "node:fs";
import { withLock } from "./lock.mjs";
import { run } from "./processes.mjs";
import { inProject } from "./project.mjs";
import { Refusal, say } from "./say.mjs";

/** @typedef {{ version?: string, optional?: boolean, link?: boolean, os?: string[], cpu?: string[], libc?: string[] }} Entry */
/** @typedef {{ os: string, cpu: string, libc: string }} Machine */

/** @returns {Machine} */
function thisMachine() {
  const report = process.report.getReport();
  const header = "header" in report ? Object(report.header) : {};
  return { os: process.platform, cpu: process.arch, libc: header.glibcVersionRuntime ? "glibc" : "musl" };
}

/**
 * The first package that is not installed as locked, or undefined. npm writes its own record of what it installed last of all, so
 * an installation that was cut short is noticed, and one made by hand with `npm install` is good enough. Optional packages are asked
 * for only when they are made for this machine (compiled parts); a folder copied from another kind of machine is noticed by them.
 * @param {Record<string, Entry>} locked `packages` of package-lock.json
 * @param {Record<string, Entry>} installed `packages` of node_modules/.package-lock.json
 * @param {Machine} machine
 */
export function firstDifference(locked, installed, machine) {
  return Object.entries(locked).find(([place, entry]) => {
    if (!place.startsWith("node_modules/") || entry.link) return false;
    const there = installed[place];
    if (there) return there.version !== entry.version;
    return !entry.optional || isMadeFor(entry, machine);
  })?.[0];
}

/**
 * @param {Entry} entry
 * @param {Machine} machine
 */
function isMadeFor(entry, machine) {
  return Boolean(
    entry.os?.includes(machine.os) && entry.cpu?.includes(machine.cpu) && (!entry.libc || entry.libc.includes(machine.libc)),
  );
}

/** @param {string} file */
function packagesIn(file) {
  if (!fs.existsSync(file)) return undefined;
  return JSON.parse(fs.readFileSync(file, "utf8")).packages;
}

function isInstalled() {
  const installed = packagesIn(inProject("node_modules", ".package-lock.json"));
  return (
    installed !== undefined && firstDifference(packagesIn(inProject("package-lock.json")), installed, thisMachine()) === undefined
  );
}

/** Installs the locked packages unless they are there already. */
export async function ensureDependencies() {
  if (isInstalled()) return;
  await withLock("dependencies", "installing the npm packages", async () => {
    if (isInstalled()) return;
    say("Installing the npm packages (a minute or two the first time).");
    const [program, ...args] = npmCommand();
    // NODE_ENV=production would leave out what the build and the tests need.
    const code = await run(program, [...args, "ci", "--include=dev", "--include=optional"], { cwd: inProject() });
    if (code !== 0 || !isInstalled()) {
      throw new Refusal(
        "The npm packages could not be installed (npm's own message stands above).",
        "Check the network and the registry npm is set to use, then run the command again.",
      );
    }
  });
}

/** The newest npm that runs on every supported Node.js. */
const readyNpm = "npm@10.9.9";

/**
 * The npm that started this command, if one did. Debian 13 ships npm 9.2, which cannot read a lock file whose overrides name a folder
 * ("Invalid comparator: file:…"); it can fetch and run a newer one, though.
 * @returns {[string, ...string[]]}
 */
function npmCommand() {
  /** @type {[string, ...string[]]} */
  const npm = process.env.npm_execpath ? [process.execPath, process.env.npm_execpath] : ["npm"];
  const [program, ...args] = npm;
  const version = spawnSync(program, [...args, "--version"], { encoding: "utf8" });
  if (version.error) throw new Refusal("npm is not on the PATH.", "Install npm beside Node.js, then run the command again.");
  if (Number.parseInt(version.stdout, 10) >= 10) return npm;
  say(`npm ${version.stdout.trim()} is too old for the lock file; using ${readyNpm} for this step.`);
  return [program, ...args, "exec", "--yes", `--package=${readyNpm}`, "--", "npm"];
}
