/** The code on paper, rendered and read as a phone would: by a reader that shares nothing with the program that draws it. */
import { execFileSync } from "node:child_process";
import jsQr from "jsqr";
import sharp from "sharp";
import { describe, expect, test } from "vitest";
import { orderPdf } from "@/lib/server/print/order-pdf";
import { qrCode } from "@/lib/server/print/qr-code";
import { makeOrder } from "../support/make-order";

const dotsPerInch = 200;

async function readCode(pdf: Uint8Array): Promise<string | undefined> {
  const png = execFileSync("pdftoppm", ["-r", String(dotsPerInch), "-f", "1", "-l", "1", "-png", "-"], {
    input: pdf,
    maxBuffer: 64 * 1024 * 1024,
  });
  const { data, info } = await sharp(png).ensureAlpha().raw().toBuffer({ resolveWithObject: true });
  return jsQr(new Uint8ClampedArray(data), info.width, info.height)?.data;
}

describe.each(["a4", "letter"] as const)("the code on the first page, on %s", (paper) => {
  test("leads to the order at the bench, with its revision", async () => {
    const order = await makeOrder();
    const benchUrl = `https://wood.example/bench/${order.id}?revision=${order.revision}`;
    const pdf = await orderPdf({ order, timeZone: "Europe/Berlin", benchUrl, pictures: new Map() }, paper);
    expect(await readCode(pdf)).toBe(benchUrl);
  });
});

test("an address as long as they come is still read", async () => {
  const order = await makeOrder();
  const benchUrl = `https://cutting-list.the-joinery-on-the-quay.example:8443/bench/${order.id}?revision=100000`;
  const pdf = await orderPdf({ order, timeZone: "Europe/Berlin", benchUrl, pictures: new Map() }, "a4");
  expect(await readCode(pdf)).toBe(benchUrl);
});

test("the runs on screen are read too", async () => {
  const url = "https://wood.example/bench/01a2308e-5a61-738a-9730-8eb00ca41ccf?revision=1";
  const { size, runs } = qrCode(url);
  const path = runs.map(({ x, y, length }) => `M${x} ${y}h${length}v1h${-length}z`).join("");
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" viewBox="-4 -4 ${size + 8} ${size + 8}" width="400" height="400"><rect x="-4" y="-4" width="100%" height="100%" fill="#fff"/><path d="${path}"/></svg>`;
  const { data, info } = await sharp(Buffer.from(svg)).ensureAlpha().raw().toBuffer({ resolveWithObject: true });
  expect(jsQr(new Uint8ClampedArray(data), info.width, info.height)?.data).toBe(url);
});
