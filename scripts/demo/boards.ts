/** The demo's rack: invented boards, each grown by the sawmill from its seed. Data only. */
import type { BoardOptions } from "@/lib/sawmill/board-face";
import type { Card } from "@/lib/sawmill/subject";

export interface DemoWood extends BoardOptions {
  readonly thicknessMm: number;
  /** A sheet of paper lying on the board, by which it is brought to scale. */
  readonly sheet?: Card;
}

/** What has to be drawn round: knots always, and sapwood along the far edge as an area or by an outline that leaves it out. */
export type SapwoodDrawn = "none" | "area" | "outline";

export interface DemoPhoto {
  readonly fileName: string;
  readonly wood: DemoWood;
  readonly widthPx: number;
  readonly heightPx: number;
  readonly daysAgo: number;
}

export interface DemoReading {
  readonly percent: number;
  readonly daysAgo: number;
}

export interface DemoBoard {
  /** What the demo's jobs call it; its tag number comes from the shop's counter. */
  readonly key: string;
  readonly species: string;
  readonly cut: BoardOptions["cut"];
  readonly nominalQuarters: number | null;
  readonly sizeMm: { readonly length: number; readonly width: number; readonly thickness: number };
  readonly place: string;
  readonly source: string;
  readonly costEuro: number | null;
  readonly note: string;
  readonly readings: readonly DemoReading[];
  /** null: entered by hand, not photographed yet. */
  readonly photo: DemoPhoto | null;
  readonly sapwood: SapwoodDrawn;
}

/** A long board fills a photograph that was cropped to a strip; what a phone's whole frame adds is only bench. */
const strip = { widthPx: 3600, heightPx: 1000 };
const offcutFrame = { widthPx: 2400, heightPx: 1000 };

type Told = Omit<DemoBoard, "cut" | "sizeMm" | "photo"> & { readonly daysAgo: number; readonly fileName: string };

function photographed(wood: DemoWood, { daysAgo, fileName, ...told }: Told): DemoBoard {
  const { cut, lengthMm, widthMm, thicknessMm } = wood;
  const frame = lengthMm > 800 ? strip : offcutFrame;
  const sizeMm = { length: lengthMm, width: widthMm, thickness: thicknessMm };
  return { ...told, cut, sizeMm, photo: { fileName, wood, daysAgo, ...frame } };
}

export const demoBoards: readonly DemoBoard[] = [
  photographed(
    { species: "walnut", cut: "flat", lengthMm: 2350, widthMm: 212, thicknessMm: 27, seed: 4 },
    {
      key: "walnut long",
      species: "Black walnut",
      nominalQuarters: 4,
      place: "rack 1 top",
      source: "Vessel Creek Timber",
      costEuro: 168,
      note: "Best of the parcel. Keep for the reading room.",
      readings: [
        { percent: 9.6, daysAgo: 41 },
        { percent: 8.8, daysAgo: 6 },
      ],
      sapwood: "none",
      daysAgo: 6,
      fileName: "walnut-long.jpg",
    },
  ),
  photographed(
    { species: "walnut", cut: "flat", lengthMm: 2310, widthMm: 206, thicknessMm: 27, seed: 6 },
    {
      key: "walnut clear",
      species: "Black walnut",
      nominalQuarters: 4,
      place: "rack 1 top",
      source: "Vessel Creek Timber",
      costEuro: 172,
      note: "",
      readings: [{ percent: 8.8, daysAgo: 6 }],
      sapwood: "none",
      daysAgo: 6,
      fileName: "walnut-clear.jpg",
    },
  ),
  photographed(
    {
      species: "cherry",
      cut: "flat",
      lengthMm: 2680,
      widthMm: 248,
      thicknessMm: 26,
      seed: 3,
      sheet: { xMm: 2350, yMm: 19, lengthMm: 297, widthMm: 210 },
    },
    {
      key: "cherry wide",
      species: "Black cherry",
      nominalQuarters: 4,
      place: "rack 1 middle",
      source: "Hollin & Daughters",
      costEuro: 154,
      note: "Brought to scale by the sheet of A4 at the right-hand end.",
      readings: [{ percent: 8.7, daysAgo: 5 }],
      sapwood: "none",
      daysAgo: 5,
      fileName: "cherry-with-sheet.jpg",
    },
  ),
  photographed(
    { species: "oak", cut: "quarter", lengthMm: 1850, widthMm: 226, thicknessMm: 27, seed: 3 },
    {
      key: "oak quartered",
      species: "White oak",
      nominalQuarters: 4,
      place: "rack 2 left",
      source: "Hollin & Daughters",
      costEuro: 131.5,
      note: "Fleck all over. Sapwood along the lower edge.",
      readings: [{ percent: 8.9, daysAgo: 5 }],
      sapwood: "area",
      daysAgo: 5,
      fileName: "oak-quartered.jpg",
    },
  ),
  photographed(
    { species: "ash", cut: "flat", lengthMm: 1980, widthMm: 196, thicknessMm: 34, seed: 2 },
    {
      key: "ash",
      species: "Ash",
      nominalQuarters: 5,
      place: "rack 2 right",
      source: "Marl Bank sawmill",
      costEuro: 74,
      note: "Came in last and is still wetter than the rest: let it settle before milling.",
      readings: [{ percent: 10.3, daysAgo: 3 }],
      sapwood: "none",
      daysAgo: 3,
      fileName: "ash-new.jpg",
    },
  ),
  photographed(
    { species: "walnut", cut: "rift", lengthMm: 1450, widthMm: 122, thicknessMm: 27, seed: 4 },
    {
      key: "walnut narrow",
      species: "Black walnut",
      nominalQuarters: 4,
      place: "rack 1 bottom",
      source: "Vessel Creek Timber",
      costEuro: 46,
      note: "Outline drawn to leave the sapwood out.",
      readings: [{ percent: 8.8, daysAgo: 6 }],
      sapwood: "outline",
      daysAgo: 6,
      fileName: "walnut-narrow.jpg",
    },
  ),
  photographed(
    { species: "oak", cut: "rift", lengthMm: 1420, widthMm: 150, thicknessMm: 22, seed: 1 },
    {
      key: "oak rift",
      species: "White oak",
      nominalQuarters: null,
      place: "bench 2",
      source: "Hollin & Daughters",
      costEuro: 48,
      note: "",
      readings: [{ percent: 8.8, daysAgo: 20 }],
      sapwood: "area",
      daysAgo: 20,
      fileName: "oak-rift.jpg",
    },
  ),
  photographed(
    { species: "pine", cut: "flat", lengthMm: 2120, widthMm: 186, thicknessMm: 28, seed: 6 },
    {
      key: "pine",
      species: "Pine",
      nominalQuarters: null,
      place: "loft",
      source: "Marl Bank sawmill",
      costEuro: 21,
      note: "For backs and test cuts.",
      readings: [{ percent: 8.9, daysAgo: 12 }],
      sapwood: "none",
      daysAgo: 12,
      fileName: "pine-knotty.jpg",
    },
  ),
  photographed(
    { species: "oak", cut: "flat", lengthMm: 640, widthMm: 178, thicknessMm: 26, seed: 8 },
    {
      key: "oak offcut",
      species: "White oak",
      nominalQuarters: 4,
      place: "offcut bin A",
      source: "Offcut of the stair treads",
      costEuro: null,
      note: "",
      readings: [{ percent: 8.8, daysAgo: 4 }],
      sapwood: "none",
      daysAgo: 4,
      fileName: "offcut-oak.jpg",
    },
  ),
  photographed(
    { species: "cherry", cut: "quarter", lengthMm: 520, widthMm: 136, thicknessMm: 24, seed: 2 },
    {
      key: "cherry offcut",
      species: "Black cherry",
      nominalQuarters: 4,
      place: "offcut bin A",
      source: "Offcut of a bench top",
      costEuro: null,
      note: "Long enough for one small front.",
      readings: [{ percent: 8.7, daysAgo: 4 }],
      sapwood: "none",
      daysAgo: 4,
      fileName: "offcut-cherry.jpg",
    },
  ),
  {
    key: "ash quartered",
    species: "Ash",
    cut: "quarter",
    nominalQuarters: 6,
    sizeMm: { length: 1720, width: 140, thickness: 40 },
    place: "rack 2 right",
    source: "Marl Bank sawmill",
    costEuro: 61,
    note: "Measured with the tape. Still to be photographed.",
    readings: [{ percent: 8.9, daysAgo: 2 }],
    photo: null,
    sapwood: "none",
  },
];

/** Taken by the assistant this morning; nobody has marked it yet. */
export const loosePhoto: DemoPhoto = {
  fileName: "ash-from-the-loft.jpg",
  wood: { species: "ash", cut: "flat", lengthMm: 1560, widthMm: 164, thicknessMm: 30, seed: 6 },
  ...strip,
  daysAgo: 0,
};
