/** Long work that keeps the server busy while pages are asked for. */
import { setTimeout as sleep } from "node:timers/promises";
import { type Um, umFromMm } from "@/lib/layout";
import { createBoard } from "@/lib/schemas/board";
import { uploadPhoto } from "@/lib/schemas/photo";
import { startStraightening } from "@/lib/schemas/straightening";
import { cancelTask, getTask } from "@/lib/schemas/task";
import type { BenchPhoto } from "./photos";
import type { WebClient } from "./web-client";

/** Starts its work again as often as it ends, until the signal; then stops it and waits until it has stopped. */
export type LongWork = (signal: AbortSignal) => Promise<void>;

const pollMs = 200;

/** A board of its own, straightened from this photograph over and over. */
export async function straightening(client: WebClient, { name, jpeg, marking }: BenchPhoto): Promise<LongWork> {
  const board = await client.call(createBoard, { body: { ...plainBoard, length: null, width: null, reading: null, note: name } });
  const query = { uploadKey: crypto.randomUUID(), fileName: "bench.jpg" };
  const photo = await client.upload(uploadPhoto, { query }, jpeg);
  return async (signal) => {
    while (!signal.aborted) {
      const sent = { params: { boardId: board.id }, body: { photoId: photo.id, marking } };
      const { taskId } = await client.call(startStraightening, sent);
      if (taskId !== null) await ended(client, taskId, signal);
    }
  };
}

const plainBoard = {
  species: "black walnut",
  cut: "flat" as const,
  nominalQuarters: null,
  thickness: umFromMm(27) as Um,
  place: "",
  source: "",
  costMinor: null,
};

async function ended(client: WebClient, taskId: string, signal: AbortSignal): Promise<void> {
  const asked = { params: { taskId } };
  for (let cancelled = false; ; await sleep(pollMs)) {
    const { state, failure } = await client.call(getTask, asked);
    if (state === "failed") throw new Error(`long work of the bench failed: ${failure}`);
    if (state === "done" || state === "cancelled") return;
    if (signal.aborted && !cancelled) {
      await client.call(cancelTask, asked);
      cancelled = true;
    }
  }
}
