/** Boards, jobs and faces for browser tests, made by the API as a maker's browser would. */
import type { APIRequestContext } from "@playwright/test";
import sharp from "sharp";
import { type Board, boardSchema } from "@/lib/schemas/board";
import { faceRowSchema, jobSchema } from "@/lib/schemas/job";
import { photoSchema } from "@/lib/schemas/photo";
import { straighteningSchema } from "@/lib/schemas/straightening";
import { expect } from "./test";

const origin = process.env.BASE_URL ?? "";

interface SizeMm {
  readonly lengthMm: number;
  readonly widthMm: number;
}

/** Taken at this scale a photograph holds enough for the finest straightened picture, 4 px/mm. */
const PHOTO_PX_PER_MM = 2.7;
const MARGIN_PX = 40;

/** Brown with darker lines along the grain, square on, on grey. */
async function photograph({ lengthMm, widthMm }: SizeMm): Promise<Buffer> {
  const width = Math.round(lengthMm * PHOTO_PX_PER_MM);
  const height = Math.round(widthMm * PHOTO_PX_PER_MM);
  const wood = Buffer.alloc(width * height * 3);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const ring = Math.sin(y / 9 + 3 * Math.sin(x / 900)) * 22;
      const at = (y * width + x) * 3;
      wood[at] = 160 + ring;
      wood[at + 1] = 116 + ring;
      wood[at + 2] = 74 + ring;
    }
  }
  return sharp(wood, { raw: { width, height, channels: 3 } })
    .extend({ top: MARGIN_PX, bottom: MARGIN_PX, left: MARGIN_PX, right: MARGIN_PX, background: "#8a8f8c" })
    .jpeg()
    .toBuffer();
}

/** A board in the rack with its straightened picture. */
export async function makeBoard(request: APIRequestContext, size: SizeMm): Promise<Board> {
  const { lengthMm, widthMm } = size;
  const [length, width] = [lengthMm * 1000, widthMm * 1000];
  const fields = { species: "Ash", cut: "flat", nominalQuarters: 4, thickness: 27_000, length, width };
  const blank = { place: "rack 1", source: "", costMinor: null, note: "", reading: null };
  const entered = await request.post("/api/boards", { data: { ...fields, ...blank }, headers: { origin } });
  const board = boardSchema.parse(await entered.json());

  await straighten(request, board.id, size);
  return board;
}

/** Photographs a board and has the picture straightened: its first version, or a newer one. */
export async function straighten(request: APIRequestContext, boardId: string, size: SizeMm): Promise<void> {
  const { lengthMm, widthMm } = size;
  const query = `uploadKey=${crypto.randomUUID()}&fileName=board.jpg`;
  const upload = await request.post(`/api/photos?${query}`, { data: await photograph(size), headers: { origin } });
  const { id: photoId } = photoSchema.parse(await upload.json());
  const [left, top] = [MARGIN_PX, MARGIN_PX];
  const [right, bottom] = [left + Math.round(lengthMm * PHOTO_PX_PER_MM), top + Math.round(widthMm * PHOTO_PX_PER_MM)];
  const marking = {
    reference: { kind: "board", length: lengthMm * 1000, width: widthMm * 1000 },
    corners: [
      { x: left, y: top },
      { x: right, y: top },
      { x: right, y: bottom },
      { x: left, y: bottom },
    ],
    extraPoints: [],
    edgePoints: [],
  };
  const started = await request.post(`/api/boards/${boardId}/straightenings`, {
    data: { photoId, marking },
    headers: { origin },
  });
  const { id } = straighteningSchema.parse(await started.json());
  const state = async () => straighteningSchema.parse(await (await request.get(`/api/straightenings/${id}`)).json()).state;
  await expect.poll(state, { timeout: 40_000 }).toBe("done");
}

/** Marks a knot on a board's picture. */
export async function markKnot(request: APIRequestContext, boardId: string, atMm: { x: number; y: number }): Promise<void> {
  const listed = await request.get(`/api/boards/${boardId}/straightenings`);
  const { items } = (await listed.json()) as { items: unknown[] };
  const { id, zones } = straighteningSchema.parse(items[0]);
  const area = {
    shape: "ellipse",
    centre: { x: atMm.x * 1000, y: atMm.y * 1000 },
    radiusX: 20_000,
    radiusY: 15_000,
    turnDeg: 0,
  };
  const keepClear = [{ id: crypto.randomUUID(), kind: "knot", area, note: "" }];
  const data = { outline: null, keepClear, revision: zones.revision };
  const saved = await request.put(`/api/straightenings/${id}/zones`, { data, headers: { origin } });
  expect(saved.ok()).toBe(true);
}

interface Fronts {
  readonly columnsMm: readonly number[];
  readonly rowsMm: readonly number[];
  readonly kerfMm?: number;
  readonly cleanUpMm?: number;
}

/** A job with one face of fronts, gaps of 3 mm; the address of its layout table. */
export async function makeFace(
  request: APIRequestContext,
  sawId: string,
  { columnsMm, rowsMm, kerfMm = 2.4, cleanUpMm = 0.2 }: Fronts,
): Promise<string> {
  const job = { title: "Map chest", client: "Harbour library", note: "", dueOn: null };
  const opened = jobSchema.parse(await (await request.post("/api/jobs", { data: job, headers: { origin } })).json());
  const cleanUp = Math.round(cleanUpMm * 1000);
  const loss = { kerf: Math.round(kerfMm * 1000), cleanUpBefore: cleanUp, cleanUpAfter: cleanUp };
  const data = {
    title: "Top row",
    face: {
      columns: columnsMm.map((mm) => mm * 1000),
      rows: rowsMm.map((mm) => mm * 1000),
      columnGaps: columnsMm.slice(1).map(() => 3000),
      rowGaps: rowsMm.slice(1).map(() => 3000),
      grain: "horizontal",
    },
    crosscut: loss,
    rip: loss,
    crosscutSawId: sawId,
    ripSawId: sawId,
    spacing: "followGap",
  };
  const added = await request.post(`/api/jobs/${opened.id}/faces`, { data, headers: { origin } });
  const { id } = faceRowSchema.parse(await added.json());
  return `/jobs/${opened.id}/faces/${id}`;
}
