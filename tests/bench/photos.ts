/** Photographs for the bench, taken in the sawmill and kept in .data/bench, because taking one of 12 megapixels takes half a minute. */
import { createHash } from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import { type FourCorners, type Marking, umFromMm } from "@/lib/layout";
import { hirePhotographers } from "@/scripts/demo/photographers";

export interface BenchPhoto {
  readonly name: string;
  readonly jpeg: Uint8Array;
  readonly marking: Marking;
}

export interface PhotoWanted {
  readonly name: string;
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly widthPx: number;
  readonly heightPx: number;
}

/** What makes a photograph: when any of it changes, the kept ones are of no use. */
const makers = ["lib/sawmill", "scripts/demo/photograph.ts"];

export async function benchPhotos(wanted: readonly PhotoWanted[]): Promise<readonly BenchPhoto[]> {
  const photographers = hirePhotographers();
  try {
    return await Promise.all(wanted.map((one) => photoOf(one, photographers.take)));
  } finally {
    await photographers.dismiss();
  }
}

async function photoOf(wanted: PhotoWanted, take: ReturnType<typeof hirePhotographers>["take"]): Promise<BenchPhoto> {
  const { name, lengthMm, widthMm, widthPx, heightPx } = wanted;
  const kept = path.join(".data", "bench", "photos", `${stampOf(wanted)}`);
  if (!fs.existsSync(`${kept}.json`)) {
    const wood = { species: "walnut", cut: "flat", lengthMm, widthMm, thicknessMm: 27, seed: 4 } as const;
    const photo = { fileName: `${name}.jpg`, wood, widthPx, heightPx, daysAgo: 0 };
    const { jpeg, cornersPx } = await take({ photo, scale: 1, takenAt: "2026-03-14T09:30:00" });
    fs.mkdirSync(path.dirname(kept), { recursive: true });
    fs.writeFileSync(`${kept}.jpg`, jpeg);
    fs.writeFileSync(`${kept}.json`, JSON.stringify(cornersPx));
  }
  const [a, b, c, d]: [number, number][] = JSON.parse(fs.readFileSync(`${kept}.json`, "utf8"));
  const corners = [a, b, c, d].map(([x, y] = [0, 0]) => ({ x, y })) as unknown as FourCorners;
  const reference = { kind: "board", length: umFromMm(lengthMm), width: umFromMm(widthMm) } as const;
  const marking = { reference, corners, extraPoints: [], edgePoints: [] };
  return { name, jpeg: new Uint8Array(fs.readFileSync(`${kept}.jpg`)), marking };
}

function stampOf(wanted: PhotoWanted): string {
  const hash = createHash("sha256").update(JSON.stringify(wanted));
  for (const maker of makers) {
    const files = fs.statSync(maker).isDirectory() ? fs.readdirSync(maker).map((file) => path.join(maker, file)) : [maker];
    for (const file of files.sort()) hash.update(fs.readFileSync(file));
  }
  return hash.digest("hex").slice(0, 24);
}
