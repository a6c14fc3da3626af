/** Cut orders as files: the order itself, and its labels. */
import "server-only";
import { findStraightening } from "@/db/queries/straightening";
import type { ShopId } from "@/db/shop-id";
import type { Order } from "@/lib/schemas/order";
import { revisionLetter } from "@/lib/words/revision-letter";
import { database } from "../database";
import { env } from "../env";
import { refused } from "../faults";
import { fileResponse } from "../http/binary";
import { type LabelSheetName, labelSheets, labelsOnSheet } from "../print/label-sheet";
import type { Paper } from "../print/paper";
import type { BoardPicture } from "../print/print-order";
import { printInThread } from "../print/print-pool";
import { shopSettings } from "../shops";
import { storage } from "../storage";
import { readOrder } from "./read-orders";

/** Where an order is worked off at the bench. It names the revision: who scans an old sheet is told that it is old. */
export const benchUrl = (orderId: string, revision: number): string =>
  new URL(`/bench/${orderId}?revision=${revision}`, env().APP_URL).href;

export async function orderFile(
  shopId: ShopId,
  orderId: string,
  wanted: { readonly revision?: number | undefined; readonly paper?: Paper | undefined },
): Promise<Response> {
  const order = await readOrder(shopId, orderId, wanted.revision);
  const shop = await shopSettings(shopId);
  const print = {
    order,
    timeZone: shop.timeZone,
    benchUrl: benchUrl(orderId, order.revision),
    pictures: await picturesOf(shopId, order),
  };
  const bytes = await printInThread("order", { print, paper: wanted.paper ?? shop.paper });
  return pdfResponse(bytes, `cut-order-${order.number}-${revisionLetter(order.revision)}.pdf`);
}

export async function labelFile(
  shopId: ShopId,
  orderId: string,
  wanted: { readonly revision?: number | undefined; readonly sheet?: LabelSheetName | undefined; readonly start: number },
): Promise<Response> {
  const order = await readOrder(shopId, orderId, wanted.revision);
  const sheet = wanted.sheet ?? ((await shopSettings(shopId)).paper === "a4" ? "a4-24" : "letter-30");
  const most = labelsOnSheet(labelSheets[sheet]);
  if (wanted.start > most) {
    throw refused(`This sheet has ${most} labels: begin at one of them.`, { start: [`At most ${most}`] });
  }
  const bytes = await printInThread("labels", { order, sheet, start: wanted.start });
  return pdfResponse(bytes, `labels-${order.number}-${revisionLetter(order.revision)}.pdf`);
}

/** Not kept by browsers: a revision that is superseded meanwhile has to say so when it is printed again. */
function pdfResponse(bytes: Uint8Array, fileName: string): Response {
  return fileResponse({ bytes, kind: "application/pdf", fileName, immutable: false });
}

/** Printed 7 in wide at some 220 dots an inch. */
const enoughPx = 1500;

/** The smallest level of each board's picture that prints well; none for a board whose picture has no file. */
async function picturesOf(shopId: ShopId, { snapshot }: Order): Promise<Map<string, BoardPicture>> {
  const found = snapshot.boards.map(async ({ straighteningId }): Promise<readonly (readonly [string, BoardPicture])[]> => {
    const straightening = await findStraightening(database(), shopId, straighteningId);
    const levels = [...(straightening?.levels ?? [])].sort((a, b) => a.widthPx - b.widthPx);
    const level = levels.find(({ widthPx }) => widthPx >= enoughPx) ?? levels.at(-1);
    const jpeg = level && (await storage().get(level.key));
    return jpeg ? [[straighteningId, { jpeg }]] : [];
  });
  return new Map((await Promise.all(found)).flat());
}
