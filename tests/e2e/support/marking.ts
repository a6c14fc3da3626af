/** The marking screen as a person uses it, and a photograph of a board whose corners are known. */
import { type APIRequestContext, expect, type Locator, type Page } from "@playwright/test";
import sharp from "sharp";
import { boardSchema } from "@/lib/schemas/board";
import { type Photo, photoSchema } from "@/lib/schemas/photo";

const origin = process.env.BASE_URL ?? "";

export interface Spot {
  readonly x: number;
  readonly y: number;
}

/** px of the photograph: a board of 1200 × 200 mm seen from in front, with an A4 sheet's worth of pattern left out. */
export const boardCorners: readonly [Spot, Spot, Spot, Spot] = [
  { x: 212, y: 301 },
  { x: 1391, y: 322 },
  { x: 1447, y: 561 },
  { x: 150, y: 548 },
];
export const photoSize = { width: 1600, height: 1000 };

export function photograph(): Promise<Buffer> {
  const [a, b, c, d] = boardCorners;
  const at = (from: Spot, to: Spot, share: number) => `${from.x + (to.x - from.x) * share},${from.y + (to.y - from.y) * share}`;
  const grain = [0.15, 0.3, 0.42, 0.6, 0.75, 0.9].map((share) => `<path d="M${at(a, d, share)}L${at(b, c, share)}"/>`).join("");
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="1600" height="1000"><rect width="1600" height="1000" fill="#8a8f8c"/>
    <polygon points="${[a, b, c, d].map(({ x, y }) => `${x},${y}`).join(" ")}" fill="#a8794a"/><g stroke="#7d5632" stroke-width="4">${grain}</g></svg>`;
  return sharp(Buffer.from(svg)).jpeg().toBuffer();
}

interface Entered {
  readonly boardId: string;
  readonly photo: Photo;
}

/** A board without a picture, and its photograph taken in. */
export async function boardToMark(request: APIRequestContext, size: { length: number; width: number } | null): Promise<Entered> {
  const data = {
    species: "Sycamore",
    cut: "flat",
    nominalQuarters: null,
    thickness: 26_000,
    length: size?.length ?? null,
    width: size?.width ?? null,
    place: "",
    source: "",
    costMinor: null,
    note: "",
    reading: null,
  };
  const board = boardSchema.parse(await (await request.post("/api/boards", { data, headers: { origin } })).json());
  const query = `uploadKey=${crypto.randomUUID()}&fileName=sycamore.jpg`;
  const upload = await request.post(`/api/photos?${query}`, { data: await photograph(), headers: { origin } });
  return { boardId: board.id, photo: photoSchema.parse(await upload.json()) };
}

export class MarkingPage {
  readonly page: Page;
  readonly picture: Locator;
  readonly straighten: Locator;

  constructor(page: Page) {
    this.page = page;
    this.picture = page.getByAltText("Photograph sycamore.jpg");
    this.straighten = page.getByRole("button", { name: "Straighten", exact: true });
  }

  async open({ boardId, photo }: Entered): Promise<void> {
    await this.page.goto(`/rack/${boardId}/mark?photo=${photo.id}`);
    await expect(this.corner(1)).toBeVisible();
  }

  corner(number: number): Locator {
    return this.page.getByRole("button", { name: new RegExp(`^Board, corner ${number}:`) });
  }

  /** Where a place of the photograph is on the screen now. */
  async onScreen({ x, y }: Spot): Promise<Spot> {
    const box = await this.picture.boundingBox();
    if (!box) throw new Error("the photograph is not in view");
    return { x: box.x + (x * box.width) / photoSize.width, y: box.y + (y * box.height) / photoSize.height };
  }

  async drag(handle: Locator, to: Spot): Promise<void> {
    const box = await handle.boundingBox();
    if (!box) throw new Error("the handle is not in view");
    const target = await this.onScreen(to);
    await this.page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
    await this.page.mouse.down();
    await this.page.mouse.move(target.x - 7, target.y - 5);
    await this.page.mouse.move(target.x, target.y);
    await this.page.mouse.up();
  }

  async markCorners(): Promise<void> {
    for (const [index, corner] of boardCorners.entries()) await this.drag(this.corner(index + 1), corner);
  }

  /** px of the photograph, as the handle tells it. */
  async positionOf(handle: Locator): Promise<Spot> {
    const label = (await handle.getAttribute("aria-label")) ?? "";
    const [, x, y] = /([\d.]+) px from the left, ([\d.]+) px from the top/.exec(label)?.map(Number) ?? [];
    if (x === undefined || y === undefined) throw new Error(`no position in: ${label}`);
    return { x, y };
  }

  async tap(at: Spot): Promise<void> {
    const { x, y } = await this.onScreen(at);
    await this.page.mouse.click(x, y);
  }
}
