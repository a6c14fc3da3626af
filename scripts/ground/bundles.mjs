// The programs outside the web server (migrating, seeding, long tasks, pixel work), bundled by scripts/bundle.mjs into .data/build.
import { launch, run } from "./processes.mjs";
import { inData, inProject } from "./project.mjs";
import { Refusal } from "./say.mjs";

/** @param {string[]} [further] programs beside the usual ones, by their paths */
export async function buildBundles(further = []) {
  // A process of its own: esbuild is there only once the packages are installed, and this file is loaded before.
  const code = await run(process.execPath, [inProject("scripts", "bundle.mjs"), ...further], { cwd: inProject() });
  if (code !== 0)
    throw new Refusal("The programs under scripts/ could not be bundled (the reason stands above).", "Mend the source it names.");
}

/**
 * Brings the database's tables up to date.
 * @param {NodeJS.ProcessEnv} env with DATABASE_URL
 */
export async function migrate(env) {
  if ((await runBundle("migrate", env)) === 0) return;
  throw new Refusal(
    "The database could not be brought up to date (the reason stands above).",
    "See that DATABASE_URL names a MariaDB 10.6 or newer that this machine reaches, and a user who may create tables.",
  );
}

/**
 * Runs a bundled program to its end and returns its exit code.
 * @param {string} name
 * @param {NodeJS.ProcessEnv} env
 * @param {string[]} [args]
 */
export function runBundle(name, env, args = []) {
  return run(process.execPath, [...bundleArgs(name), ...args], { cwd: inProject(), env });
}

/**
 * Runs a bundled program and returns what it wrote; its complaints go to the terminal.
 * @param {string} name
 * @param {NodeJS.ProcessEnv} env
 */
export async function readBundle(name, env) {
  const { child, exited } = launch(process.execPath, bundleArgs(name), {
    cwd: inProject(),
    env,
    stdio: ["ignore", "pipe", "inherit"],
  });
  let text = "";
  child.stdout?.setEncoding("utf8").on("data", (part) => {
    text += part;
  });
  return { code: await exited, text };
}

/** @param {string} name */
function bundleArgs(name) {
  return ["--enable-source-maps", inData("build", `${name}.mjs`)];
}
