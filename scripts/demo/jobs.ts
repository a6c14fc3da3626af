/** The demo's jobs: invented clients, furniture and plans. Sizes and starting places; the core finds what is clear of the knots. Data only. */
import { type GridFace, gridFace, rowFace, sizesFromOpening, stackFace, um, umFromMm } from "@/lib/layout";

/** Nearest corner of a group on its board, mm; the layout slides it along the board from there until it is clear. */
export interface DemoPlace {
  readonly board: string;
  readonly xMm: number;
  readonly yMm: number;
}

export interface DemoFace {
  readonly title: string;
  readonly face: GridFace;
  readonly place: DemoPlace;
  /** A piece let loose from the set and laid elsewhere on the same board. */
  readonly loose?: { readonly piece: string } & Omit<DemoPlace, "board">;
  /** Left as it lies, so that the layout table has something to complain of. */
  readonly leftInTrouble?: true;
  /** `part`: issued, and the assistant has begun. `cut`: all ticked. `revised`: issued, changed and issued again. */
  readonly order?: "part" | "cut" | "revised";
}

export interface DemoJob {
  readonly title: string;
  readonly client: string;
  readonly note: string;
  /** Days from the day the demo is made; negative: in the past. */
  readonly dueInDays: number | null;
  readonly closed?: true;
  readonly faces: readonly DemoFace[];
}

const gap = umFromMm(3);
const mm = (...lengths: number[]) => lengths.map((length) => umFromMm(length));

/** Three drawers in the opening of a bedside cabinet, each 24 mm higher than the one above, to the half millimetre. */
function bedsideFronts(): GridFace {
  const opening = { opening: umFromMm(520), count: 3, gap, outerBefore: umFromMm(2), outerAfter: umFromMm(2) };
  const found = sizesFromOpening({
    ...opening,
    graduation: { kind: "step", step: umFromMm(24) },
    sizeStep: { um: 500, parts: 1 },
  });
  if (!found.ok) throw new Error(`the bedside drawers do not fit their opening: ${found.reason}`);
  return stackFace(found.sizes, umFromMm(226), gap, "vertical");
}

export const demoJobs: readonly DemoJob[] = [
  {
    title: "Key cabinet for the porter's lodge",
    client: "Ansgar House",
    note: "Delivered. Four small fronts, cut from one rift board.",
    dueInDays: -4,
    closed: true,
    faces: [
      {
        title: "Key drawers",
        face: rowFace(mm(310, 310, 310, 310), umFromMm(108), gap, "horizontal"),
        place: { board: "oak rift", xMm: 60, yMm: 8 },
        order: "cut",
      },
    ],
  },
  {
    title: "Map chest for the reading room",
    client: "Saltmere Public Library",
    note: "Figure runs through the top row without a break. Client comes to see the boards before the shallow drawers are cut.",
    dueInDays: 24,
    faces: [
      {
        title: "Top row",
        face: rowFace(mm(236, 236, 236, 236), umFromMm(182), gap, "horizontal"),
        place: { board: "walnut long", xMm: 930, yMm: 15 },
        order: "part",
      },
      {
        title: "Shallow drawers",
        face: stackFace(mm(44, 44, 44, 44), umFromMm(978), gap, "horizontal"),
        place: { board: "walnut clear", xMm: 240, yMm: 9 },
      },
      {
        title: "Label rail",
        face: rowFace(mm(318, 318, 318), umFromMm(72), gap, "horizontal"),
        place: { board: "walnut narrow", xMm: 40, yMm: 6 },
        loose: { piece: "p3", xMm: 1010, yMm: 6 },
      },
    ],
  },
  {
    title: "Pair of bedside cabinets",
    client: "Nora and Emil Haug",
    note: "Grain upright. The left one is settled; find a clear stretch for the right one.",
    dueInDays: 38,
    faces: [
      {
        title: "Left cabinet",
        face: bedsideFronts(),
        place: { board: "cherry wide", xMm: 300, yMm: 11 },
      },
      {
        title: "Right cabinet",
        face: bedsideFronts(),
        place: { board: "cherry wide", xMm: 959, yMm: 11 },
        leftInTrouble: true,
      },
    ],
  },
  {
    title: "Apothecary cabinet",
    client: "Dispensary Museum, Lower Wick",
    note: "Twelve drawers. Front 8 gets the piece with the bold fleck.",
    dueInDays: 61,
    faces: [
      {
        title: "Drawer grid",
        face: gridFace(mm(156, 156, 156, 156), mm(62, 62, 62), gap, gap, "horizontal"),
        place: { board: "oak quartered", xMm: 70, yMm: 6 },
        loose: { piece: "p8", xMm: 980, yMm: 60 },
      },
    ],
  },
  {
    title: "Sideboard for the dining room",
    client: "Grenn and Sons, wine merchants",
    note: "Three long drawers above the doors.",
    dueInDays: 17,
    faces: [
      {
        title: "Drawer row",
        face: rowFace(mm(560, 560, 560), umFromMm(164), gap, "horizontal"),
        place: { board: "ash", xMm: 60, yMm: 14 },
        order: "revised",
      },
    ],
  },
];

/** How far the maker slides the sideboard's row before issuing it again. */
export const revisedBy = { x: umFromMm(120), y: um(0) };
