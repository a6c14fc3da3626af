/** Paper is drawn in a thread of its own, and is the same paper. */
import { afterAll, beforeAll, expect, test } from "vitest";
import type { Order } from "@/lib/schemas/order";
import { labelsPdf } from "@/lib/server/print/labels-pdf";
import { orderPdf } from "@/lib/server/print/order-pdf";
import { closePrintPool, printInThread } from "@/lib/server/print/print-pool";
import { bundlePrintWorker } from "../support/bundle-worker";
import { makeOrder } from "../support/make-order";

beforeAll(bundlePrintWorker);
afterAll(closePrintPool);

const printOf = (order: Order) => ({ order, timeZone: "Europe/Berlin", benchUrl: "https://wood.example/b", pictures: new Map() });

test("a thread gives the bytes of the order and of its labels", async () => {
  const order = await makeOrder();
  const print = printOf(order);
  expect(Buffer.compare(await printInThread("order", { print, paper: "a4" }), await orderPdf(print, "a4"))).toBe(0);
  const labels = await labelsPdf(order, "a4-24", 3);
  expect(Buffer.compare(await printInThread("labels", { order, sheet: "a4-24", start: 3 }), labels)).toBe(0);
});

test("meanwhile this thread goes on", async () => {
  const print = printOf(await makeOrder({ boards: 6, frontsPerBoard: 8 }));
  let done = false;
  const printing = printInThread("order", { print, paper: "a4" }).finally(() => {
    done = true;
  });
  let turns = 0;
  while (!done) {
    await new Promise((resolve) => setImmediate(resolve));
    turns += 1;
  }
  expect((await printing).length).toBeGreaterThan(10_000);
  // Drawn here, it would be a few turns a step of the order; a thread leaves thousands.
  expect(turns).toBeGreaterThan(2_000);
});
