/** What a maker would put on a photograph of the demo: corners, sheet, keep-clear areas, outline. Worked out from the sawmill's truth. */
import { v7 as newId } from "uuid";
import { type FourCorners, type Marking, paperSizes, type StockPoint, um, umFromMm } from "@/lib/layout";
import type { KnotTruth } from "@/lib/sawmill/knots-on-face";
import type { FourPoints } from "@/lib/sawmill/photograph";
import type { SapwoodReach } from "@/lib/sawmill/sapwood-on-face";
import type { Card } from "@/lib/sawmill/subject";
import type { KeepClearArea, Zones } from "@/lib/schemas/zones";
import type { DemoBoard } from "./boards";
import type { TakenPhoto } from "./photograph";

type Marked = Pick<TakenPhoto, "cornersPx" | "sheetCornersPx">;

/** Four corners of the board; by a sheet of A4 when one lies on it, else by the size taken with the tape. */
export function markingOf({ sizeMm }: DemoBoard, { cornersPx, sheetCornersPx }: Marked): Marking {
  const size = { length: umFromMm(sizeMm.length), width: umFromMm(sizeMm.width) };
  const { lengthUm: length, widthUm: width } = paperSizes.a4;
  return {
    reference: sheetCornersPx ? { kind: "sheet", length, width, corners: cornersOf(sheetCornersPx) } : { kind: "board", ...size },
    corners: cornersOf(cornersPx),
    extraPoints: [],
    edgePoints: [],
  };
}

type Seen = Pick<TakenPhoto, "knots" | "sapwood">;

/** Areas and outline of a board, in its stock frame. */
export function zonesOf(board: DemoBoard, { knots, sapwood }: Seen): Pick<Zones, "outline" | "keepClear"> {
  const sheet = board.photo?.wood.sheet;
  const areas: Omit<KeepClearArea, "id">[] = knots.map(knotArea);
  if (sheet) areas.push({ kind: "other", area: rectangleOf(sheet), note: "Under the sheet of paper: figure not seen" });
  if (board.sapwood === "area") areas.push({ kind: "sapwood", area: sapwoodArea(board, sapwood), note: "" });
  return {
    outline: board.sapwood === "outline" ? heartwoodOutline(board, sapwood) : null,
    keepClear: areas.map((area) => ({ ...area, id: newId() })),
  };
}

/** Grain leans round a knot; a maker draws so much more than the branch itself. Along the grain it leans farther than across. */
const leaning = { alongMm: 14, acrossMm: 5 };

function knotArea({ boxMm: [left, top, right, bottom], dead }: KnotTruth): Omit<KeepClearArea, "id"> {
  return {
    kind: "knot",
    area: {
      shape: "ellipse",
      centre: at((left + right) / 2, (top + bottom) / 2),
      radiusX: whole((right - left) / 2 + leaning.alongMm),
      radiusY: whole((bottom - top) / 2 + leaning.acrossMm),
      turnDeg: 0,
    },
    note: dead ? "Dead knot, may fall out" : "",
  };
}

function sapwoodArea({ sizeMm: { length, width } }: DemoBoard, reach: readonly SapwoodReach[]): KeepClearArea["area"] {
  return { shape: "polygon", points: [...borderOf(reach), at(length, width), at(0, width)] };
}

function heartwoodOutline({ sizeMm: { length } }: DemoBoard, reach: readonly SapwoodReach[]): StockPoint[] {
  return [at(0, 0), at(length, 0), ...borderOf(reach).reverse()];
}

function borderOf(reach: readonly SapwoodReach[]): StockPoint[] {
  return reach.map(({ xMm, fromMm }) => at(xMm, fromMm));
}

function rectangleOf({ xMm, yMm, lengthMm, widthMm }: Card): KeepClearArea["area"] {
  const [right, bottom] = [xMm + lengthMm, yMm + widthMm];
  return { shape: "polygon", points: [at(xMm, yMm), at(right, yMm), at(right, bottom), at(xMm, bottom)] };
}

function cornersOf([a, b, c, d]: FourPoints): FourCorners {
  const corner = ([x, y]: FourPoints[number]) => ({ x, y });
  return [corner(a), corner(b), corner(c), corner(d)];
}

const whole = (mm: number) => um(Math.round(mm * 1000));
const at = (xMm: number, yMm: number): StockPoint => ({ x: whole(xMm), y: whole(yMm) });
