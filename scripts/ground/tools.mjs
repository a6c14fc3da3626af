// Runs the command-line tools of npm packages with this very Node.js, whatever the PATH says.
import fs from "node:fs";
import path from "node:path";
import { run } from "./processes.mjs";
import { inProject } from "./project.mjs";

/**
 * The script behind a package's command.
 * @param {string} packageName
 * @param {string} [command] when it is not named like the package
 */
export function toolScript(packageName, command = packageName) {
  const folder = inProject("node_modules", packageName);
  const { bin } = JSON.parse(fs.readFileSync(path.join(folder, "package.json"), "utf8"));
  return path.join(folder, typeof bin === "string" ? bin : bin[command]);
}

/**
 * Runs a tool in the project's folder and returns its exit code.
 * @param {string} script from toolScript
 * @param {string[]} args
 * @param {Parameters<typeof run>[2]} [options]
 */
export function runTool(script, args, options) {
  return run(process.execPath, [script, ...args], { cwd: inProject(), ...options });
}
