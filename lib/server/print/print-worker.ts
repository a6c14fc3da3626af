/** The program of a printing thread. Bundled on its own, because threads load plain JavaScript. */
import "server-only";
import { move } from "piscina";
import { labelsPdf } from "./labels-pdf";
import { orderPdf } from "./order-pdf";
import type { PrintJobs } from "./print-job";

/** The file's bytes are handed over, not copied. */
const handedOver = (bytes: Uint8Array): Uint8Array => {
  // A small file lies in memory that it shares with others; that cannot be handed over.
  const own = bytes.byteLength === bytes.buffer.byteLength ? bytes : bytes.slice();
  return move(own) as Uint8Array;
};

export const order = async ({ print, paper }: PrintJobs["order"]): Promise<Uint8Array> =>
  handedOver(await orderPdf(print, paper));

export const labels = async ({ order: printed, sheet, start }: PrintJobs["labels"]): Promise<Uint8Array> =>
  handedOver(await labelsPdf(printed, sheet, start));
