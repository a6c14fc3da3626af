/** Orders without a database, frozen from invented layouts by the same code that issues real ones. */
import { v7 as newId } from "uuid";
import { type FaceLayout, freshLayout, gridFace, pieceIdsOf, placeGroup, type Um, um, umFromMm } from "@/lib/layout";
import type { Gluing } from "@/lib/schemas/gluing";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import type { Order } from "@/lib/schemas/order";
import { orderSteps } from "@/lib/schemas/order-steps";
import type { KeepClearArea } from "@/lib/schemas/zones";
import { fingerprintOf } from "@/lib/server/orders/fingerprint";
import { freeze } from "@/lib/server/orders/freeze";
import { planAndVerify } from "@/lib/server/orders/plan-cuts";

export interface OrderWanted {
  readonly boards: number;
  readonly frontsPerBoard: number;
  readonly frontMm: { readonly width: number; readonly height: number };
  readonly boardMm: { readonly length: number; readonly width: number };
  readonly kerfMm: number;
  readonly cleanUpMm: number;
  readonly gapMm: number;
  readonly units: "mm" | "inch";
  readonly jobTitle: string;
  readonly sawName: string;
  readonly place: string;
  readonly superseded: boolean;
  readonly keepClear: readonly KeepClearArea[];
  readonly side: "face" | "back";
  readonly glueLines: readonly Um[];
  /** The boards are blanks that are yet to be glued up. */
  readonly gluing: Gluing | null;
}

const usual: OrderWanted = {
  boards: 1,
  frontsPerBoard: 4,
  frontMm: { width: 243.2, height: 184 },
  boardMm: { length: 2350, width: 210 },
  kerfMm: 2.4,
  cleanUpMm: 0.2,
  gapMm: 3,
  units: "mm",
  jobTitle: "Map chest for the reading room",
  sawName: "Panel saw, thin blade",
  place: "rack 2 left",
  superseded: false,
  keepClear: [],
  side: "face",
  glueLines: [],
  gluing: null,
};

/** Rows of fronts, one row on each board. */
export async function makeOrder(change: Partial<OrderWanted> = {}): Promise<Order> {
  return (await makeGiven(change)).order;
}

/** The same with what it was frozen from. */
export async function makeGiven(change: Partial<OrderWanted> = {}) {
  const wanted = { ...usual, ...change };
  const boards = Array.from({ length: wanted.boards }, (_, i) => boardOf(wanted, i));
  const saw = { name: wanted.sawName, kerf: umFromMm(wanted.kerfMm), cleanUp: umFromMm(wanted.cleanUpMm) };
  const given = {
    shop: { name: "Fenwater Joinery", units: wanted.units, inchFraction: 32, ...limits },
    job: { id: newId(), number: 7, title: wanted.jobTitle, client: "Reading room of Osterwick" },
    face: { faceId: newId(), title: "Top row", layoutRevision: 7, layout: faceLayoutSchema.parse(layoutOn(wanted, boards)) },
    crosscutSaw: saw,
    ripSaw: saw,
    boards,
  } as const;
  const snapshot = await freeze(given, async (request) => planAndVerify(request));
  const [issuedAt, revisionId] = ["2026-03-14T09:30:00.000Z", newId()];
  const supersededAt = wanted.superseded ? "2026-03-15T13:05:00.000Z" : null;
  const order: Order = {
    id: newId(),
    number: 18,
    revision: 1,
    state: "issued",
    superseded: wanted.superseded,
    jobId: snapshot.job.id,
    jobTitle: snapshot.job.title,
    faceTitles: ["Top row"],
    boards: snapshot.boards.map(({ tag }) => tag),
    steps: orderSteps(snapshot).length,
    ticked: 0,
    issuedAt,
    issuedBy: "Mats Lind",
    revisionId,
    fingerprint: fingerprintOf(snapshot),
    snapshot,
    ticks: [],
    asCut: [],
    revisions: [{ id: revisionId, revision: 1, issuedAt, issuedBy: "Mats Lind", supersededAt }],
  };
  return { order, given };
}

const limits = {
  shortestCrosscut: umFromMm(300),
  narrowestRip: umFromMm(80),
  shortestMachined: umFromMm(300),
  offcutLength: umFromMm(300),
  offcutWidth: umFromMm(50),
};

function boardOf({ boardMm, place, keepClear, side, glueLines, gluing }: OrderWanted, index: number) {
  const size = { length: umFromMm(boardMm.length), width: umFromMm(boardMm.width) };
  const id = newId();
  return {
    board: { id, tagNumber: 41 + index, species: "black walnut", cut: "flat" as const, place, thickness: umFromMm(26) },
    straightening: { id: newId(), side, ...size, outline: null, zonesRevision: 0 },
    keepClear,
    glueLines,
    gluing,
  };
}

function layoutOn(wanted: OrderWanted, boards: readonly { readonly board: { readonly id: string } }[]): FaceLayout {
  const { width, height } = wanted.frontMm;
  const columns = Array.from({ length: wanted.frontsPerBoard }, () => umFromMm(width));
  const rows = boards.map(() => umFromMm(height));
  const face = gridFace(columns, rows, umFromMm(wanted.gapMm), umFromMm(wanted.gapMm), "horizontal");
  const cleanUp = umFromMm(wanted.cleanUpMm);
  const loss = { kerf: umFromMm(wanted.kerfMm), cleanUpBefore: cleanUp, cleanUpAfter: cleanUp };
  const ids = pieceIdsOf(face);
  let layout: FaceLayout = {
    ...freshLayout(face, { crosscut: loss, rip: loss, spacing: "followGap" }),
    groups: boards.map((_, i) => ({
      id: `row-${i + 1}`,
      pieceIds: ids.slice(i * wanted.frontsPerBoard, (i + 1) * wanted.frontsPerBoard),
      placement: null,
      takesPlaceOf: {},
    })),
  };
  for (const [i, { board }] of boards.entries()) {
    const placed = placeGroup(layout, `row-${i + 1}`, board.id, { x: umFromMm(96), y: um(13_000) }, 0);
    if (!placed.ok) throw new Error(`row ${i + 1} cannot be placed`);
    layout = placed.layout;
  }
  return layout;
}
