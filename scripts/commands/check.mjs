// npm run check: what can be said about a change within a minute, without a database or a browser.
import { checkLint, checkTypes, runVitest } from "../ground/checks.mjs";
import { ensureDependencies } from "../ground/dependencies.mjs";
import { prepareDataFolder } from "../ground/project.mjs";
import { say } from "../ground/say.mjs";
import { sum, summaryLine } from "../ground/summary.mjs";

export async function command() {
  prepareDataFolder();
  await ensureDependencies();
  const total = sum([...(await checkTypes()), ...(await checkLint()), ...(await runVitest("unit", process.env))]);
  say(`\n${summaryLine(total)}`);
  return total.failed === 0 ? 0 : 1;
}
