/**
 * The stored sizes of board pictures as bitmaps: fetched when first wanted, the best one at hand handed out meanwhile. A bitmap is decoded once, off the
 * main thread; an <img> would be decoded again whenever the browser drops it.
 */
import type { PictureLevel, TableBoard } from "../table-board";
import { levelFor } from "../view/choose-level";

export interface WoodBitmap {
  readonly bitmap: ImageBitmap;
  /** Bitmap pixels per µm of wood, along and across. */
  readonly perUmX: number;
  readonly perUmY: number;
}

export type PictureAtHand =
  | { readonly state: "ready"; readonly wood: WoodBitmap }
  | { readonly state: "coming" | "missing" | "failed" };

type Loading = { readonly state: "loading" | "failed" } | { readonly state: "ready"; readonly bitmap: ImageBitmap };

export class Pictures {
  readonly #levels = new Map<string, Loading>();
  readonly #onLoaded: () => void;
  readonly #abort = new AbortController();

  constructor(onLoaded: () => void) {
    this.#onLoaded = onLoaded;
  }

  /** The sharpest picture there is at hand for this scale, in device pixels per mm; the right one is fetched if it is not here yet. */
  at(board: Pick<TableBoard, "face" | "levels">, screenPxPerMm: number): PictureAtHand {
    const lengthMm = board.face.length / 1000;
    const wanted = levelFor(board.levels, lengthMm, screenPxPerMm);
    if (wanted === null) return { state: "missing" };
    const quick = board.levels.at(-1);
    // The smallest comes first: something to see within a moment.
    if (quick && !this.#levels.has(quick.url)) this.#load(quick);
    if (!this.#levels.has(wanted.url)) this.#load(wanted);
    const ready = [wanted, ...board.levels].flatMap((level) => {
      const loading = this.#levels.get(level.url);
      return loading?.state === "ready" ? [{ level, bitmap: loading.bitmap }] : [];
    });
    const [best] = ready;
    if (best) {
      const { bitmap } = best;
      return {
        state: "ready",
        wood: { bitmap, perUmX: bitmap.width / board.face.length, perUmY: bitmap.height / board.face.width },
      };
    }
    return { state: this.#levels.get(wanted.url)?.state === "failed" ? "failed" : "coming" };
  }

  dispose(): void {
    this.#abort.abort();
    for (const loading of this.#levels.values()) if (loading.state === "ready") loading.bitmap.close();
    this.#levels.clear();
  }

  #load({ url }: PictureLevel): void {
    this.#levels.set(url, { state: "loading" });
    fetchBitmap(url, this.#abort.signal).then(
      (bitmap) => {
        if (this.#abort.signal.aborted) return bitmap.close();
        this.#levels.set(url, { state: "ready", bitmap });
        this.#onLoaded();
      },
      () => {
        if (this.#abort.signal.aborted) return;
        // Shown in the picture's place; zooming to another size or opening the page again tries afresh.
        this.#levels.set(url, { state: "failed" });
        this.#onLoaded();
      },
    );
  }
}

async function fetchBitmap(url: string, signal: AbortSignal): Promise<ImageBitmap> {
  const response = await fetch(url, { signal });
  if (!response.ok) throw new Error(`picture answered with ${response.status}`);
  return createImageBitmap(await response.blob());
}
