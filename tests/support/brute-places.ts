/**
 * Places of a group valued one at a time by plain loops over pixels and by `problems()`: what the search has to agree with to the last
 * digit. Shares no code with `lib/layout/search`; takes from the core only where pieces and seams lie, what `problems()` and
 * `clearances()` say, and the grey values of a picture.
 */
import {
  type BoardFace,
  clearances,
  type FaceLayout,
  groupBounds,
  groupById,
  layOut,
  lyingPieces,
  type Piece,
  type PlaceRequest,
  type Problem,
  placeGroup,
  problems,
  type QuarterTurns,
  type Seam,
  type SearchPicture,
  seams,
  um,
} from "@/lib/layout";
import { bruteRest, type RestGrid, restGrid } from "./brute-rest";

const CELL = 500;
const DEPTH = 8;
const NAMES = ["match", "step", "symmetry", "clear", "rest", "stock"] as const;
type Parts = Record<(typeof NAMES)[number], number | null>;

export interface BruteGround {
  readonly layout: FaceLayout;
  readonly groupId: string;
  readonly board: BoardFace;
  readonly picture: SearchPicture;
  /** Of other boards. */
  readonly pictures: ReadonlyMap<string, SearchPicture>;
  readonly weights: Readonly<Record<(typeof NAMES)[number], number>>;
  readonly stock: number;
  /** The board without the group, and the smallest rectangle worth keeping. */
  readonly rest: RestGrid;
}

/** Null where it cannot be told; the step in µm. */
interface BruteSeam {
  readonly a: string;
  readonly b: string;
  readonly match: number | null;
  readonly step: number | null;
  readonly peak: number | null;
}

export interface BruteValue {
  readonly parts: Parts;
  readonly total: number;
  /** Between the group's own pieces first, then those to others, each kind in the order of the face. */
  readonly seams: readonly BruteSeam[];
  /** Of the corner and the seams between the group's own pieces, µm along the board, the seams' in order. */
  readonly marks: readonly number[];
}

/** A request for a search as the brute force works on it; on the first of its sides, which the layout lies on. */
export function bruteGround({ layout, groupId, sides, neighbours, weights, stock, leastOffcut }: PlaceRequest): BruteGround {
  const [side] = sides;
  if (side === undefined) throw new Error("no side to search");
  const { board, picture } = side;
  const kerfs = { along: layout.crosscut.kerf, across: layout.rip.kerf };
  const others = lyingPieces(layout).filter((piece) => piece.groupId !== groupId && piece.stockId === board.id);
  const taken = [
    ...others.map(({ blank: { along, across } }) => ({
      left: along.from - kerfs.along,
      right: along.to + kerfs.along,
      top: across.from - kerfs.across,
      bottom: across.to + kerfs.across,
    })),
    ...board.spokenFor.map(({ rect, kerfs: theirs }) => ({
      left: rect.x - Math.max(kerfs.along, theirs.along),
      right: rect.x + rect.width + Math.max(kerfs.along, theirs.along),
      top: rect.y - Math.max(kerfs.across, theirs.across),
      bottom: rect.y + rect.height + Math.max(kerfs.across, theirs.across),
    })),
  ];
  const pictures = new Map(neighbours.map((neighbour) => [neighbour.stockId, neighbour.picture]));
  return { layout, groupId, board, picture, pictures, weights, stock, rest: restGrid(board, taken, leastOffcut) };
}

/** Null where the place is not allowed. */
export function bruteAt(ground: BruteGround, x: number, y: number, turns: QuarterTurns): BruteValue | null {
  const laid = placeGroup(ground.layout, ground.groupId, ground.board.id, { x: um(x), y: um(y) }, turns);
  if (!laid.ok) throw new Error("the group cannot be laid");
  const own = new Set(groupById(laid.layout, ground.groupId)?.pieceIds);
  if (problems(laid.layout, [ground.board]).some((problem) => isOwnProblem(problem, own))) return null;
  return bruteValue(ground, laid.layout, own);
}

/** A group that lies on the board, wherever and however well. */
export function bruteValue(ground: BruteGround, layout: FaceLayout, own: ReadonlySet<string>): BruteValue {
  const { match, step, joints, seams } = seamParts(ground, layout, own);
  const parts: Parts = {
    match,
    step,
    symmetry: symmetry(ground, layout, own),
    clear: clear(ground, layout, own),
    rest: bruteRest(ground.rest, takenBy(layout, ground.groupId)),
    stock: ground.stock,
  };
  let [sum, weight] = [0, 0];
  for (const name of NAMES) {
    const part = parts[name];
    if (part === null) continue;
    sum += ground.weights[name] * part;
    weight += ground.weights[name];
  }
  const corner = groupBounds(layout, ground.groupId)?.x ?? 0;
  return { parts, total: weight === 0 ? 0 : sum / weight, seams, marks: [corner, ...joints] };
}

export function isOwnProblem(problem: Problem, own: ReadonlySet<string>): boolean {
  const { kind } = problem;
  if (kind === "outside" || kind === "keep-clear" || kind === "spoken-for") return own.has(problem.piece);
  if (kind === "too-close") return own.has(problem.pieces[0]) !== own.has(problem.pieces[1]);
  return kind === "grain" && problem.pieces.some((id) => own.has(id));
}

function clear({ board }: BruteGround, layout: FaceLayout, own: ReadonlySet<string>): number {
  const rooms = clearances(layout, [board]).flatMap(({ piece, room }) => (own.has(piece) ? [room] : []));
  return Math.min(30_000, ...rooms) / 30_000;
}

// Seams

interface Window {
  readonly x: number;
  readonly depth: number;
  readonly y: number;
  readonly count: number;
  readonly backwards: boolean;
}

function seamParts(ground: BruteGround, layout: FaceLayout, own: ReadonlySet<string>) {
  const pieces = new Map(layOut(layout).map((piece) => [piece.id, piece]));
  const readings: { seam: BruteSeam; fixed: boolean }[] = [];
  const joints: number[] = [];
  for (const seam of seams(layout)) {
    if (!own.has(seam.a) && !own.has(seam.b)) continue;
    const [a, b] = [pieces.get(seam.a), pieces.get(seam.b)];
    if (a === undefined || b === undefined) continue;
    const [p, q] = [windowOn(seam, a, false), windowOn(seam, b, true)];
    if (p === null || q === null) continue;
    const count = Math.min(p.count, q.count);
    if (count < 40) continue;
    const fixed = !own.has(seam.a) || !own.has(seam.b);
    if (!fixed && (p.backwards !== q.backwards || (p.x === q.x && p.y === q.y))) continue;
    const [profileA, profileB] = [
      profile(ground, a, p, { count, from: own.has(a.id) ? p : q }),
      profile(ground, b, q, { count, from: own.has(a.id) ? p : q }),
    ];
    if (profileA === null || profileB === null) continue;
    readings.push({ seam: { a: seam.a, b: seam.b, ...readSeam(profileA, profileB, p.depth, q.depth) }, fixed });
    if (!fixed) joints.push((p.x + q.x) * (CELL / 2));
  }
  joints.sort((one, other) => one - other);
  const inOrder = [...readings.filter(({ fixed }) => !fixed), ...readings.filter(({ fixed }) => fixed)].map(({ seam }) => seam);
  if (inOrder.length === 0) return { match: null, step: null, joints, seams: [] };
  let [match, step] = [0, 0];
  for (const seam of inOrder) {
    match += Math.min(1, Math.max(0, seam.match ?? 0));
    step += seam.step === null ? 0 : 1 - Math.abs(seam.step) / 8_000;
  }
  return { match: match / inOrder.length, step: step / inOrder.length, joints, seams: inOrder };
}

function mapped({ stockFromFace: m }: Piece, x: number, y: number): { x: number; y: number } {
  return { x: m.a * x + m.c * y + m.tx, y: m.b * x + m.d * y + m.ty };
}

function extent(piece: Piece) {
  const corners = piece.outline.map(({ x, y }) => mapped(piece, x, y));
  const [xs, ys] = [corners.map(({ x }) => x), corners.map(({ y }) => y)];
  return { left: Math.min(...xs), right: Math.max(...xs), top: Math.min(...ys), bottom: Math.max(...ys) };
}

/** Whole cells of the piece within 4 mm of the edge. */
function windowOn(seam: Seam, piece: Piece, beyondGap: boolean): Window | null {
  const [dx, dy] = seam.normal === "right" ? [1, 0] : [0, 1];
  const gap = beyondGap ? seam.gap : 0;
  const from = mapped(piece, seam.from.x + dx * gap, seam.from.y + dy * gap);
  const to = mapped(piece, seam.to.x + dx * gap, seam.to.y + dy * gap);
  if (from.x !== to.x || from.y === to.y) return null;
  const { left, right } = extent(piece);
  const pieceIsLeft = Math.abs(right - from.x) < Math.abs(left - from.x);
  const cells: number[] = [];
  for (let x = Math.floor(left / CELL) - 1; x <= Math.ceil(right / CELL); x++) {
    if (x * CELL >= left && (x + 1) * CELL <= right) cells.push(x);
  }
  const near = pieceIsLeft ? cells.slice(-DEPTH) : cells.slice(0, DEPTH);
  if (near.length === 0) return null;
  const [top, bottom] = [Math.min(from.y, to.y), Math.max(from.y, to.y)];
  const y = Math.ceil(top / CELL);
  return { x: near[0] as number, depth: near.length, y, count: Math.floor(bottom / CELL) - y, backwards: to.y < from.y };
}

/** Sums of grey, in the direction of y of the piece that moves; where both have not as many rows, counted from its first. */
function profile(
  ground: BruteGround,
  piece: Piece,
  window: Window,
  { count, from }: { count: number; from: Window },
): number[] | null {
  const picture = piece.stockId === ground.board.id ? ground.picture : ground.pictures.get(piece.stockId);
  if (picture === undefined) return null;
  const opposed = window.backwards !== from.backwards;
  const sums: number[] = [];
  for (let k = 0; k < count; k++) {
    const y = opposed ? window.y + window.count - 1 - k : window.y + k;
    let sum = 0;
    for (let x = window.x; x < window.x + window.depth; x++) {
      if (x < 0 || x >= picture.width || y < 0 || y >= picture.height) return null;
      sum += picture.grey[x * picture.height + y] as number;
    }
    sums.push(sum);
  }
  // In the direction of the seam itself.
  return from.backwards ? sums.reverse() : sums;
}

function readSeam(
  a: readonly number[],
  b: readonly number[],
  depthA: number,
  depthB: number,
): Pick<BruteSeam, "match" | "step" | "peak"> {
  const match = alike(a, b, depthA, depthB);
  if (match === null) return { match: null, step: null, peak: null };
  const most = Math.min(16, Math.floor(a.length / 4));
  let best = { value: match, lag: 0 };
  for (let lag = 1; lag <= most; lag++) {
    const [tailA, headA] = [a.slice(lag), a.slice(0, a.length - lag)];
    const [tailB, headB] = [b.slice(lag), b.slice(0, b.length - lag)];
    const back = alike(tailA, headB, depthA, depthB);
    if (back !== null && back > best.value) best = { value: back, lag: -lag };
    const on = alike(headA, tailB, depthA, depthB);
    if (on !== null && on > best.value) best = { value: on, lag };
  }
  return best.value >= 0.5 ? { match, step: best.lag * CELL, peak: best.value } : { match, step: null, peak: null };
}

/** Normalised cross-correlation; null where either varies by less than two levels of grey. */
function alike(a: readonly number[], b: readonly number[], depthA: number, depthB: number): number | null {
  const n = a.length;
  let [sumA, sumB, aa, bb, ab] = [0, 0, 0, 0, 0];
  for (let k = 0; k < n; k++) {
    const [p, q] = [a[k] as number, b[k] as number];
    sumA += p;
    sumB += q;
    aa += p * p;
    bb += q * q;
    ab += p * q;
  }
  const [spreadA, spreadB] = [n * aa - sumA * sumA, n * bb - sumB * sumB];
  if (spreadA < (2 * n * depthA) ** 2 || spreadB < (2 * n * depthB) ** 2) return null;
  return (n * ab - sumA * sumB) / Math.sqrt(spreadA * spreadB);
}

// Symmetry

function symmetry({ picture }: BruteGround, layout: FaceLayout, own: ReadonlySet<string>): number | null {
  const boxes = layOut(layout)
    .filter(({ id }) => own.has(id))
    .map(extent);
  const first = Math.min(...boxes.map(({ top }) => Math.ceil(top / CELL)));
  const last = Math.max(...boxes.map(({ bottom }) => Math.floor(bottom / CELL))) - 1;
  const mean = (y: number): number | null => {
    let [sum, cells] = [0, 0];
    for (const { left, right, top, bottom } of boxes) {
      if (y * CELL < top || (y + 1) * CELL > bottom) continue;
      for (let x = Math.ceil(left / CELL); (x + 1) * CELL <= right; x++) {
        sum += picture.grey[x * picture.height + y] as number;
        cells++;
      }
    }
    return cells === 0 ? null : Math.floor((64 * sum) / cells);
  };
  const means: (number | null)[] = [];
  for (let y = first; y <= last; y++) means.push(mean(y));
  const mirrored = [...means].reverse();
  let [n, sum, squares, products] = [0, 0, 0, 0];
  for (const [k, p] of means.entries()) {
    const q = mirrored[k] ?? null;
    if (p === null || q === null) continue;
    n++;
    sum += p;
    squares += p * p;
    products += p * q;
  }
  if (n < 40) return null;
  const spread = n * squares - sum * sum;
  return spread < (64 * n) ** 2 ? 0 : Math.min(1, Math.max(0, (n * products - sum * sum) / spread));
}

// What the group takes out of the board

function takenBy(layout: FaceLayout, groupId: string) {
  const blanks = lyingPieces(layout)
    .filter((piece) => piece.groupId === groupId)
    .map(({ blank }) => blank);
  const { crosscut, rip } = layout;
  return {
    left: Math.min(...blanks.map(({ along }) => along.from)) - crosscut.kerf,
    right: Math.max(...blanks.map(({ along }) => along.to)) + crosscut.kerf,
    top: Math.min(...blanks.map(({ across }) => across.from)) - rip.kerf,
    bottom: Math.max(...blanks.map(({ across }) => across.to)) + rip.kerf,
  };
}
