/** How large a folded run is drawn, and how it is shifted so that it turns about its middle. */
import type { FoldedSide, Um } from "@/lib/layout";

export interface FoldFrame {
  readonly pxPerMm: number;
  readonly heightPx: number;
  /** For translate3d: brings the middle of the plan to the origin. */
  readonly shift: string;
}

/** Of the window: what turning and tilting leave free round the run. */
const SHARE = 0.72;

export function foldFrame(
  fold: readonly FoldedSide[],
  height: Um,
  window: { readonly width: number; readonly height: number },
): FoldFrame {
  const points = fold.flatMap(({ show, inner }) => [show.from, show.to, inner.from, inner.to]);
  const [xs, ys] = [points.map(({ x }) => x), points.map(({ y }) => y)];
  const [left, right, near, far] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)];
  // Turned by any angle the run is no wider than its diagonal in plan.
  const diagonal = Math.hypot(right - left, far - near);
  const pxPerUm = SHARE * Math.min(window.width / diagonal, window.height / (height + 0.4 * diagonal));
  const middle = { x: ((left + right) / 2) * pxPerUm, y: ((near + far) / 2) * pxPerUm };
  return {
    pxPerMm: pxPerUm * 1000,
    heightPx: height * pxPerUm,
    shift: `${-middle.x}px, 0, ${middle.y}px`,
  };
}
