/**
 * The homography that takes marked photo points to their true places on the wood: exact from four marks, by least squares from
 * more, and from points of which only the line they lie on is known. Judging whether the marks make sense is `marks-check.ts`.
 */
import { applyHomography, composeHomographies, depthAt, type Homography, type MmPoint, type PhotoPoint } from "./homography";
import { leastSquares } from "./least-squares";

/** A photo point whose place on the wood is known. */
export interface Mark {
  readonly photo: PhotoPoint;
  readonly stockMm: MmPoint;
}

/** The line a·x + b·y = c of the wood, mm, with a² + b² = 1, so that a·x + b·y − c is a distance. */
export interface StockLine {
  readonly a: number;
  readonly b: number;
  readonly c: number;
}

/** A photo point known to lie somewhere on a line of the wood. */
export interface LineMark {
  readonly photo: PhotoPoint;
  readonly line: StockLine;
}

/** Passes that turn the algebraic error into millimetres; the depths settle in two or three. */
const REWEIGHTINGS = 4;

/**
 * Stock mm from photo px, or null where the marks do not fix a map (fewer than eight conditions, points in line) or would put a
 * mark behind the camera. Scaled to depth 1 at the marks' centroid.
 *
 * Normalised direct linear transform (Hartley & Zisserman, Multiple View Geometry, 2nd ed. 2003, ch. 4): both sides are moved
 * to centroid 0 and mean distance √2. The free factor is fixed by depth 1 at the centroid, which lies in front of the camera for
 * every quadrilateral that `marks-check.ts` lets through, so the system is linear in eight unknowns. Each condition
 * "on the line a·x + b·y = c" is one row; a mark is the two lines x = X and y = Y. With more than eight rows, rows are divided by
 * the depth found in the pass before, which makes their residual a distance on the wood.
 */
export function fitHomography(marks: readonly Mark[], lineMarks: readonly LineMark[] = []): Homography | null {
  const conditions: LineMark[] = [...marks.flatMap(asLineMarks), ...lineMarks];
  if (marks.length === 0 || conditions.length < 8) return null;
  const photo = normaliser(conditions.map((condition) => condition.photo));
  const stock = normaliser(marks.map((mark) => mark.stockMm));
  if (photo === null || stock === null) return null;

  const normalised = conditions.map(({ photo: p, line }) => ({
    photo: { x: (p.x - photo.x) * photo.scale, y: (p.y - photo.y) * photo.scale },
    line: { a: line.a, b: line.b, c: (line.c - line.a * stock.x - line.b * stock.y) * stock.scale },
  }));
  const fitted = reweighted(normalised, conditions.length === 8 ? 1 : REWEIGHTINGS);
  if (fitted === null || normalised.some(({ photo: p }) => !(depthAt(fitted, p) > 0))) return null;

  const toNormalised: Homography = [photo.scale, 0, -photo.x * photo.scale, 0, photo.scale, -photo.y * photo.scale, 0, 0, 1];
  const fromNormalised: Homography = [1 / stock.scale, 0, stock.x, 0, 1 / stock.scale, stock.y, 0, 0, 1];
  return composeHomographies(fromNormalised, composeHomographies(fitted, toNormalised));
}

/** Distance on the wood between where the map puts a mark and where it belongs, mm. */
export function markResidualMm(stockMmFromPhoto: Homography, mark: Mark): number {
  const found = applyHomography(stockMmFromPhoto, mark.photo);
  return Math.hypot(found.x - mark.stockMm.x, found.y - mark.stockMm.y);
}

/** Signed distance on the wood from where the map puts the point to its line, mm. */
export function lineResidualMm(stockMmFromPhoto: Homography, { photo, line }: LineMark): number {
  const found = applyHomography(stockMmFromPhoto, photo);
  return line.a * found.x + line.b * found.y - line.c;
}

/** Root mean square; 0 of nothing. */
export function rootMeanSquare(values: readonly number[]): number {
  if (values.length === 0) return 0;
  return Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
}

function asLineMarks({ photo, stockMm }: Mark): LineMark[] {
  return [
    { photo, line: { a: 1, b: 0, c: stockMm.x } },
    { photo, line: { a: 0, b: 1, c: stockMm.y } },
  ];
}

function reweighted(conditions: readonly LineMark[], passes: number): Homography | null {
  let fitted: Homography = [0, 0, 0, 0, 0, 0, 0, 0, 1];
  for (let pass = 0; pass < passes; pass++) {
    const weights = conditions.map(({ photo }) => 1 / depthAt(fitted, photo));
    const rows = conditions.map(({ photo: { x, y }, line: { a, b, c } }, i) =>
      [a * x, a * y, a, b * x, b * y, b, -c * x, -c * y].map((value) => value * (weights[i] as number)),
    );
    const solution = leastSquares(
      rows,
      conditions.map(({ line }, i) => line.c * (weights[i] as number)),
    );
    if (solution === null) return null;
    const [h0 = 0, h1 = 0, h2 = 0, h3 = 0, h4 = 0, h5 = 0, h6 = 0, h7 = 0] = solution;
    fitted = [h0, h1, h2, h3, h4, h5, h6, h7, 1];
  }
  return fitted;
}

function normaliser(points: readonly { x: number; y: number }[]): { x: number; y: number; scale: number } | null {
  const x = points.reduce((sum, p) => sum + p.x, 0) / points.length;
  const y = points.reduce((sum, p) => sum + p.y, 0) / points.length;
  const distance = points.reduce((sum, p) => sum + Math.hypot(p.x - x, p.y - y), 0) / points.length;
  return distance > 0 && Number.isFinite(distance) ? { x, y, scale: Math.SQRT2 / distance } : null;
}
