/** Cut orders for browser tests: a face laid on a board, issued, and slid afterwards, by the API as a maker's browser would. */
import type { APIRequestContext } from "@playwright/test";
import { type FaceLayout, moveGroup, placeGroup, SET_ID, um } from "@/lib/layout";
import type { Board } from "@/lib/schemas/board";
import { faceLayoutSchema, layoutSchema } from "@/lib/schemas/layout";
import { type OrderRow, orderRowSchema } from "@/lib/schemas/order";
import { makeFace } from "./stock";
import { expect } from "./test";

const origin = process.env.BASE_URL ?? "";

export interface Laid {
  readonly faceId: string;
  /** Of the layout table. */
  readonly address: string;
}

/** Three fronts in a row, from 60 mm off the board's left end. */
export async function layOnBoard(
  request: APIRequestContext,
  sawId: string,
  board: Board,
  loss: { readonly kerfMm?: number; readonly cleanUpMm?: number } = {},
): Promise<Laid> {
  const address = await makeFace(request, sawId, { columnsMm: [240, 240, 240], rowsMm: [150], ...loss });
  const faceId = address.split("/").at(-1) ?? "";
  const put = await request.post(`/api/faces/${faceId}/layout/boards`, { data: { boardId: board.id }, headers: { origin } });
  expect(put.ok()).toBe(true);
  await saveLayout(request, faceId, (document) => placeGroup(document, SET_ID, board.id, { x: um(60_000), y: um(20_000) }, 0));
  return { faceId, address };
}

/** Slides the whole set along the board, as a later thought of the maker does. */
export async function slideLayout(request: APIRequestContext, faceId: string, byMm: number): Promise<void> {
  await saveLayout(request, faceId, (document) => moveGroup(document, SET_ID, { x: um(byMm * 1000), y: um(0) }));
}

export async function issue(request: APIRequestContext, faceId: string): Promise<OrderRow> {
  const { revision } = await readLayout(request, faceId);
  const answer = await request.post(`/api/faces/${faceId}/order`, { data: { layoutRevision: revision }, headers: { origin } });
  expect(answer.status(), await answer.text()).toBe(200);
  return orderRowSchema.parse(await answer.json());
}

async function readLayout(request: APIRequestContext, faceId: string) {
  return layoutSchema.parse(await (await request.get(`/api/faces/${faceId}/layout`)).json());
}

async function saveLayout(
  request: APIRequestContext,
  faceId: string,
  change: (document: FaceLayout) => ReturnType<typeof moveGroup>,
): Promise<void> {
  const { document, revision, crosscutSawId, ripSawId } = await readLayout(request, faceId);
  const changed = change(document);
  if (!changed.ok) throw new Error(`the layout cannot be changed so: ${changed.refusal.reason}`);
  const data = { baseRevision: revision, document: faceLayoutSchema.parse(changed.layout), crosscutSawId, ripSawId };
  const saved = await request.put(`/api/faces/${faceId}/layout`, { data, headers: { origin } });
  expect(saved.status(), await saved.text()).toBe(200);
}
