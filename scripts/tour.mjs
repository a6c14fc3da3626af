// npm run tour: takes the README's pictures from a running copy with the demo. Address: first argument, else http://127.0.0.1:3000.
import { execFileSync } from "node:child_process";
import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { chromium } from "@playwright/test";
import { whereIs } from "./ground/packages.mjs";
import { inProject } from "./ground/project.mjs";
import { say } from "./ground/say.mjs";

const address = process.argv[2] ?? "http://127.0.0.1:3000";
// The demo's maker, see demo/people.ts.
const maker = { email: "maker@tarnholt.example", password: "try-the-demo" };
const folder = inProject("docs", "tour");

fs.mkdirSync(folder, { recursive: true });
const browser = await chromium.launch({
  executablePath: process.env.CHROMIUM || whereIs("chromium"),
  args: ["--no-sandbox", "--disable-gpu"],
});
try {
  const context = await browser.newContext({ baseURL: address, viewport: { width: 1280, height: 800 }, locale: "en-GB" });
  const answer = await context.request.post("/api/session", { data: maker, headers: { origin: address } });
  if (!answer.ok()) throw new Error(`${address} does not let the demo's maker in: ${answer.status()}`);
  const page = await context.newPage();
  /** @param {string} where @returns {Promise<any>} as the API answers */
  const get = async (where) => (await context.request.get(where)).json();

  const boards = (await get("/api/boards?pageSize=100")).items.filter(
    (/** @type {{ straighteningId: string | null }} */ board) => board.straighteningId !== null,
  );
  const [straightened] = (await get(`/api/boards/${boards[0].id}/straightenings`)).items;
  const job = await jobCalled("Map chest");
  const orders = (await get("/api/orders?state=issued")).items;
  const atBench = orders.find((/** @type {{ ticked: number }} */ order) => order.ticked > 0) ?? orders[0];

  await shoot("rack", "/rack");
  await shoot("marking", `/rack/${boards[0].id}/mark?photo=${straightened.photoId}`);
  await shoot("layout-table", `/jobs/${job.id}/faces/${job.faceList[0].id}`);
  await page.setViewportSize({ width: 390, height: 844 });
  await shoot("bench", `/bench/${atBench.id}`);
  await paper("cut-order", `/api/orders/${atBench.id}/pdf?paper=a4`);

  /** @param {string} title */
  async function jobCalled(title) {
    const { items } = await get(`/api/jobs?search=${encodeURIComponent(title)}`);
    if (!items[0]) throw new Error(`the demo has no job called ${title}`);
    return get(`/api/jobs/${items[0].id}`);
  }

  /** @param {string} name @param {string} where */
  async function shoot(name, where) {
    await page.goto(where, { waitUntil: "networkidle" });
    // Pictures fade in from smaller levels.
    await page.waitForTimeout(1500);
    await page.screenshot({ path: path.join(folder, `${name}.png`) });
    say(`docs/tour/${name}.png`);
  }

  /** @param {string} name @param {string} where */
  async function paper(name, where) {
    const scratch = fs.mkdtempSync(path.join(os.tmpdir(), "tour-"));
    fs.writeFileSync(path.join(scratch, "order.pdf"), await (await context.request.get(where)).body());
    execFileSync("pdftoppm", ["-r", "84", "-png", "-singlefile", path.join(scratch, "order.pdf"), path.join(folder, name)]);
    fs.rmSync(scratch, { recursive: true });
    say(`docs/tour/${name}.png`);
  }
} finally {
  await browser.close();
}
