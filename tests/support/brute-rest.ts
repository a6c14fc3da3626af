/**
 * What can be kept of a board, cell by cell of half a millimetre, and the largest rectangle of it, by plain geometry and plain loops.
 * Shares no code with the core.
 */
import type { BoardFace, KeepClearShape } from "@/lib/layout";

const CELL = 500;

/** µm. */
export interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

export interface RestGrid {
  readonly columns: number;
  readonly rows: number;
  /** `free[y][x]` */
  readonly free: readonly (readonly boolean[])[];
  /** Smallest rectangle worth keeping, cells. */
  readonly least: { readonly along: number; readonly across: number };
  readonly whole: number;
}

/** `taken`: what of the board is not to be had, kerf included. */
export function restGrid(board: BoardFace, taken: readonly Box[], leastUm: { along: number; across: number }): RestGrid {
  const [columns, rows] = [Math.floor(board.length / CELL), Math.floor(board.width / CELL)];
  const free: boolean[][] = [];
  for (let y = 0; y < rows; y++) {
    const line: boolean[] = [];
    for (let x = 0; x < columns; x++) line.push(isFree(board, taken, cellBox(x, y)));
    free.push(line);
  }
  const least = { along: Math.max(1, Math.ceil(leastUm.along / CELL)), across: Math.max(1, Math.ceil(leastUm.across / CELL)) };
  return { columns, rows, free, least, whole: largest(free, columns, least) };
}

/** Share of the largest rectangle of the whole that is left beside a box; null where there is none to begin with. */
export function bruteRest(grid: RestGrid, taken: Box): number | null {
  if (grid.whole === 0) return null;
  const free = grid.free.map((line, y) => line.map((cell, x) => cell && !meet(cellBox(x, y), taken)));
  return largest(free, grid.columns, grid.least) / grid.whole;
}

function cellBox(x: number, y: number): Box {
  return { left: x * CELL, right: (x + 1) * CELL, top: y * CELL, bottom: (y + 1) * CELL };
}

function meet(p: Box, q: Box): boolean {
  return p.left < q.right && q.left < p.right && p.top < q.bottom && q.top < p.bottom;
}

/** Row by row, each column's height of free cells above; every rectangle with its foot on the row is under that skyline. */
function largest(free: readonly (readonly boolean[])[], columns: number, least: { along: number; across: number }): number {
  const heights = new Array<number>(columns).fill(0);
  let best = 0;
  for (const line of free) {
    for (let x = 0; x < columns; x++) heights[x] = line[x] ? (heights[x] as number) + 1 : 0;
    const open: { start: number; height: number }[] = [];
    for (let x = 0; x <= columns; x++) {
      const height = heights[x] ?? 0;
      let start = x;
      for (let top = open.at(-1); top !== undefined && top.height > height; top = open.at(-1)) {
        open.pop();
        start = top.start;
        if (top.height >= least.across && x - start >= least.along) best = Math.max(best, top.height * (x - start));
      }
      if (open.at(-1)?.height !== height) open.push({ start, height });
    }
  }
  return best;
}

function isFree(board: BoardFace, taken: readonly Box[], cell: Box): boolean {
  if (taken.some((box) => meet(box, cell))) return false;
  if (board.outline !== null) {
    const middle = { x: (cell.left + cell.right) / 2, y: (cell.top + cell.bottom) / 2 };
    if (edgeInside(board.outline, cell) || !holds(board.outline, middle)) return false;
  }
  return board.keepClear.every(({ area }) => !touches(area, cell));
}

interface Place {
  readonly x: number;
  readonly y: number;
}

function touches(area: KeepClearShape, cell: Box): boolean {
  if (area.shape === "polygon") {
    const middle = { x: (cell.left + cell.right) / 2, y: (cell.top + cell.bottom) / 2 };
    return edgeInside(area.points, cell) || holds(area.points, middle);
  }
  // The ellipse made a unit circle: does a side of the cell, now a parallelogram, come nearer to its middle than 1?
  const turn = (area.turnDeg * Math.PI) / 180;
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)];
  const flat = (x: number, y: number): Place => {
    const [dx, dy] = [x - area.centre.x, y - area.centre.y];
    return { x: (dx * cos + dy * sin) / area.radiusX, y: (dy * cos - dx * sin) / area.radiusY };
  };
  const { centre } = area;
  if (centre.x >= cell.left && centre.x <= cell.right && centre.y >= cell.top && centre.y <= cell.bottom) return true;
  const corners = [
    flat(cell.left, cell.top),
    flat(cell.right, cell.top),
    flat(cell.right, cell.bottom),
    flat(cell.left, cell.bottom),
  ];
  return corners.some((corner, index) => nearestToOrigin(corner, corners[(index + 1) % 4] as Place) < 1 - 1e-8);
}

function nearestToOrigin(p: Place, q: Place): number {
  const [dx, dy] = [q.x - p.x, q.y - p.y];
  const t = Math.min(1, Math.max(0, -(p.x * dx + p.y * dy) / (dx * dx + dy * dy)));
  return Math.hypot(p.x + t * dx, p.y + t * dy);
}

/** Whether an edge passes through the open inside of the cell: clipped to it, something of it is left. */
function edgeInside(points: readonly Place[], { left, right, top, bottom }: Box): boolean {
  return points.some((start, index) => {
    const end = points[(index + 1) % points.length] as Place;
    let [from, to] = [0, 1];
    for (const [p, d, low, high] of [
      [start.x, end.x - start.x, left, right],
      [start.y, end.y - start.y, top, bottom],
    ] as const) {
      if (d === 0) {
        if (p <= low || p >= high) return false;
        continue;
      }
      const [t, u] = [(low - p) / d, (high - p) / d];
      from = Math.max(from, Math.min(t, u));
      to = Math.min(to, Math.max(t, u));
    }
    return to - from > 1e-9;
  });
}

function holds(points: readonly Place[], { x, y }: Place): boolean {
  let inside = false;
  points.forEach((start, index) => {
    const end = points[(index + 1) % points.length] as Place;
    if (start.y > y !== end.y > y && x < start.x + ((end.x - start.x) * (y - start.y)) / (end.y - start.y)) inside = !inside;
  });
  return inside;
}
