/** How the work on a job grows with its pieces. */
import { type FaceLayout, layOut, seams } from "@/lib/layout";
import type { Order } from "@/lib/schemas/order";
import { orderPdf } from "@/lib/server/print/order-pdf";
import { makeOrder, type OrderWanted } from "../../support/make-order";
import type { Effort, Outcome, Row } from "../row";
import { sideBySide } from "../side-by-side";

export const jobRow: Row = {
  name: "job",
  what: "a face of 300 pieces on 30 boards: layout, cut programs and their proof, order, paper",
  against: "a face of 30 pieces on 3 boards",
  aim: { kind: "at most", ratio: 12 },
  measure,
};

const board = { frontsPerBoard: 10, frontMm: { width: 180, height: 184 } } as const;

async function measure({ quick }: Effort): Promise<Outcome> {
  const large = quick ? { boards: 2, frontsPerBoard: 4 } : { ...board, boards: 30 };
  const small = quick ? { boards: 1, frontsPerBoard: 2 } : { ...board, boards: 3 };
  const turns = quick ? { warmUps: 0, repetitions: 2 } : { warmUps: 2, repetitions: 9 };
  const [many, few] = [await makeOrder(large), await makeOrder(small)];
  const cases = [
    await sideBySide("all of it", { ours: () => wholeJob(large), theirs: () => wholeJob(small) }, turns),
    await sideBySide("pieces and seams alone", { ours: () => laidOut(many), theirs: () => laidOut(few) }, turns),
    await sideBySide("cut programs and order alone", { ours: () => makeOrder(large), theirs: () => makeOrder(small) }, turns),
    await sideBySide("paper alone", { ours: () => paper(many), theirs: () => paper(few) }, turns),
  ];
  return { kind: "measured", cases };
}

/** An order is frozen from its layout by the code that issues real ones: problems, programs, replay, fingerprint. */
async function wholeJob(wanted: Partial<OrderWanted>): Promise<void> {
  const order = await makeOrder(wanted);
  laidOut(order);
  await paper(order);
}

function laidOut({ snapshot }: Order): void {
  for (const { layout } of snapshot.faces) piecesAndSeams(layout);
}

function piecesAndSeams(layout: FaceLayout): void {
  layOut(layout);
  seams(layout);
}

const paper = (order: Order): Promise<Uint8Array> =>
  orderPdf({ order, timeZone: "Europe/Berlin", benchUrl: `https://wood.example/bench/${order.id}`, pictures: new Map() }, "a4");
