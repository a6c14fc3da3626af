/** Fills the demo's rack as its people would: photographs taken in, boards entered and read, marked, straightened, areas drawn. */
import { setTimeout as sleep } from "node:timers/promises";
import { v7 as newId } from "uuid";
import { umFromMm } from "@/lib/layout";
import { markingSchema } from "@/lib/schemas/marking";
import type { Photo } from "@/lib/schemas/photo";
import type { ShopAccess } from "@/lib/server/access";
import { addReading } from "@/lib/server/boards/add-reading";
import { enterBoard } from "@/lib/server/boards/enter-board";
import { takeInPhoto } from "@/lib/server/photos/take-in-photo";
import { saveZones } from "@/lib/server/straightenings/save-zones";
import { startStraightening } from "@/lib/server/straightenings/start-straightening";
import { readTask } from "@/lib/server/tasks/tasks";
import { type DemoBoard, type DemoPhoto, demoBoards, loosePhoto } from "./boards";
import { dateFrom, daysFrom } from "./days";
import type { DemoShop } from "./found-shop";
import { markingOf, zonesOf } from "./marks";
import type { TakenPhoto } from "./photograph";
import type { TakePhoto } from "./photographers";

export interface Taking {
  readonly shop: DemoShop;
  readonly now: Date;
  readonly takePhoto: TakePhoto;
  /** Of the photographs' full size along each side. */
  readonly photoScale: number;
  readonly say: (line: string) => void;
  /** Aborted when nobody works off tasks any more: waiting for a picture then is in vain. */
  readonly ending: AbortSignal;
}

/** Board ids by the scenario's keys. All pictures are straightened when it answers; somebody has to be working off tasks meanwhile. */
export async function takeInBoards(taking: Taking): Promise<ReadonlyMap<string, string>> {
  const { maker, assistant } = taking.shop.people;
  // All are begun at once; whoever takes them settles how many at a time.
  const photos = [...demoBoards.flatMap(({ photo }) => photo ?? []), loosePhoto];
  const taken = new Map(photos.map((photo, index) => [photo, begin(taking, photo, index)]));
  const ids = new Map<string, string>();
  const drawn: Promise<void>[] = [];
  let count = 0;
  for (const board of demoBoards) {
    const boardId = await enter(maker, board, taking.now);
    ids.set(board.key, boardId);
    const shooting = board.photo && taken.get(board.photo);
    if (!board.photo || !shooting) continue;
    count += 1;
    taking.say(`Photographing board ${count} of ${taken.size - 1}: ${board.species.toLowerCase()}`);
    const shot = await shooting;
    const photo = await takeIn(assistant, board.photo, shot);
    drawn.push(straightenAndDraw(taking, boardId, board, photo, shot));
    // Looked at together below; until then a failure must not count as unhandled.
    drawn.at(-1)?.catch(() => undefined);
  }
  const loose = await taken.get(loosePhoto);
  if (loose) await takeIn(assistant, loosePhoto, loose);
  taking.say("Straightening the last pictures");
  await Promise.all(drawn);
  return ids;
}

/** One photograph after the other, some minutes apart. */
const minutesApart = 4;

function begin({ takePhoto, photoScale, now }: Taking, photo: DemoPhoto, index: number): Promise<TakenPhoto> {
  const minutes = 60 - index * minutesApart;
  const takenAt = daysFrom(now, -photo.daysAgo - minutes / (24 * 60)).toISOString();
  const shot = takePhoto({ photo, scale: photoScale, takenAt });
  // Awaited in turn; one that fails early must not count as unhandled until then.
  shot.catch(() => undefined);
  return shot;
}

async function enter(access: ShopAccess, board: DemoBoard, now: Date): Promise<string> {
  const { species, cut, nominalQuarters, sizeMm, place, source, costEuro, note } = board;
  const [first, ...later] = board.readings.map(({ percent, daysAgo }) => ({ percent, takenOn: dateFrom(now, -daysAgo) }));
  const { id } = await enterBoard(access, {
    species,
    cut,
    nominalQuarters,
    thickness: umFromMm(sizeMm.thickness),
    length: umFromMm(sizeMm.length),
    width: umFromMm(sizeMm.width),
    place,
    source,
    costMinor: costEuro === null ? null : Math.round(costEuro * 100),
    note,
    trueEdges: "none",
    toBeFlattened: false,
    reading: first ?? null,
  });
  for (const reading of later) await addReading(access, id, reading);
  return id;
}

function takeIn(access: ShopAccess, { fileName }: DemoPhoto, { jpeg }: TakenPhoto): Promise<Photo> {
  const file = new Response(new Blob([new Uint8Array(jpeg)]));
  const request = { body: file.body, headers: new Headers(), signal: new AbortController().signal };
  return takeInPhoto(access, { uploadKey: newId(), fileName }, request);
}

async function straightenAndDraw(
  { shop, ending }: Taking,
  boardId: string,
  board: DemoBoard,
  photo: Photo,
  shot: TakenPhoto,
): Promise<void> {
  const { maker } = shop.people;
  const marking = markingSchema.parse(markingOf(board, shot));
  const { id: straighteningId, taskId, zones } = await startStraightening(maker, boardId, { photoId: photo.id, marking });
  await untilDone(maker, taskId ?? "", ending);
  const drawn = zonesOf(board, shot);
  if (drawn.outline || drawn.keepClear.length > 0) {
    await saveZones(maker, straighteningId, { ...drawn, revision: zones.revision });
  }
}

const lookEveryMs = 150;

async function untilDone(access: ShopAccess, taskId: string, ending: AbortSignal): Promise<void> {
  for (;;) {
    const { state, failure } = await readTask(access, taskId);
    if (state === "done") return;
    if (state === "failed" || state === "cancelled") throw new Error(`a picture was not straightened: ${failure ?? state}`);
    await sleep(lookEveryMs, undefined, { signal: ending });
  }
}
