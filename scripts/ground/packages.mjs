// Sees to the Debian packages. Looks for the files it needs, so that a program installed in another way is good enough.
import { spawnSync } from "node:child_process";
import fs from "node:fs";
import path from "node:path";
import { run } from "./processes.mjs";
import { Refusal, say } from "./say.mjs";

/**
 * The -core packages hold the database programs without the system service, so no second server is started on the machine.
 * @type {Record<string, { packages: string[], programs: string[] }>}
 */
const needs = {
  database: {
    packages: ["mariadb-server-core", "mariadb-client-core"],
    programs: ["mariadbd", "mariadb-install-db", "my_print_defaults"],
  },
  browser: { packages: ["chromium"], programs: ["chromium"] },
  pdfReader: { packages: ["poppler-utils"], programs: ["pdftotext", "pdfinfo", "pdftoppm"] },
};

/**
 * The full path of a program, looked for on the PATH and where Debian keeps servers.
 * @param {string} program
 * @returns {string | undefined}
 */
export function whereIs(program) {
  const folders = [...(process.env.PATH ?? "").split(path.delimiter), "/usr/sbin", "/usr/bin", "/usr/local/bin"];
  return folders.map((folder) => path.join(folder, program)).find((file) => fs.existsSync(file));
}

/**
 * Debian packages that are not there.
 * @param {string[]} wanted names from the table above
 */
export function missingPackages(wanted) {
  return wanted.flatMap((name) => {
    const need = needs[name];
    if (!need) throw new Error(`No packages are listed for "${name}".`);
    return need.programs.every(whereIs) ? [] : need.packages;
  });
}

/** @param {string[]} packages */
export function installLine(packages) {
  return `apt-get install --no-install-recommends ${packages.join(" ")}`;
}

/**
 * What to tell someone who may not install packages.
 * @param {string[]} packages
 */
export function packagesRefusal(packages) {
  return new Refusal(
    `Missing from this machine: ${packages.join(", ")}.`,
    `Install with root rights, then run the command again: sudo ${installLine(packages)}`,
  );
}

/**
 * Installs what is missing when this is root on a machine with apt; says the line to run otherwise.
 * @param {string[]} wanted
 */
export async function ensurePackages(wanted) {
  const missing = missingPackages(wanted);
  if (missing.length === 0) return;
  if (process.getuid?.() !== 0 || spawnSync("apt-get", ["--version"]).error) throw packagesRefusal(missing);
  say(`Installing ${missing.join(", ")} from Debian.`);
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  const patience = ["-o", "DPkg::Lock::Timeout=300", "-q"];
  // A failed update is not the end: the lists may be there and the packages in the cache.
  await run("apt-get", [...patience, "update"], { env });
  const code = await run("apt-get", [...patience, "install", "-y", "--no-install-recommends", ...missing], { env });
  if (code !== 0 || missingPackages(wanted).length > 0) {
    throw new Refusal(
      `apt-get could not install ${missing.join(", ")} (its own message stands above).`,
      `Check the network and the package sources, then try by hand: ${installLine(missing)}`,
    );
  }
}
