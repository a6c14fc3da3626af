/**
 * The program behind `npm run bench`: measures side by side, prints the table, keeps it as JSON. Not a test, because a ratio is no
 * verdict on a busy machine; here, because what it measures against is tests' business and never the product's.
 */
import fs from "node:fs";
import path from "node:path";
import { parseArgs } from "node:util";
import { thisMachine, versions } from "./machine";
import { type Finding, reportJson, reportText } from "./report";
import { rows } from "./rows";

const { values } = parseArgs({
  options: { only: { type: "string" }, quick: { type: "boolean", default: false }, out: { type: "string" } },
});

const chosen = rows.filter(({ name }) => values.only === undefined || name === values.only);
const at = new Date();
const machine = thisMachine();
const findings: Finding[] = [];
for (const row of chosen) {
  console.log(`measuring: ${row.name}`);
  findings.push({ row, outcome: await row.measure({ quick: values.quick }) });
}
const report = { at, quick: values.quick, machine, versions: versions(), findings };
const file = values.out ?? path.join(".data", "bench", `${at.toISOString().slice(0, 19).replaceAll(":", "")}.json`);
fs.mkdirSync(path.dirname(file), { recursive: true });
fs.writeFileSync(file, reportJson(report));
console.log(`\n${reportText(report)}\nAs JSON: ${file}`);
// Threads of pools that rows leave behind would keep the process for their idle time.
process.exit(0);
