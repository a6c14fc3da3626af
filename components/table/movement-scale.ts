/** Where moistures and widths lie in the diagram of a gap. */

export interface DiagramScale {
  readonly width: number;
  readonly height: number;
  /** The edges of the field that lines are drawn in. */
  readonly left: number;
  readonly right: number;
  readonly x: (moisture: number) => number;
  readonly y: (mm: number) => number;
}

const box = { width: 320, height: 150, left: 58, right: 308, top: 18, bottom: 124 };

/** Room for every width and for nothing at all; for today's moisture too, where it lies outside the year's. */
export function diagramScale(
  { driest, dampest, today }: { readonly driest: number; readonly dampest: number; readonly today: number | null },
  widthsMm: readonly number[],
): DiagramScale {
  const moistures = [driest, dampest, ...(today === null ? [] : [today])];
  const [from, to] = [Math.min(...moistures), Math.max(...moistures)];
  const [low, high] = [Math.min(0, ...widthsMm), Math.max(0.1, ...widthsMm)];
  const room = box.right - box.left - 20;
  return {
    ...box,
    // A place that never changes has one moisture: it stands in the middle.
    x: (moisture) => box.left + 10 + (to > from ? ((moisture - from) / (to - from)) * room : room / 2),
    y: (mm) => box.bottom - ((mm - low) / (high - low)) * (box.bottom - box.top),
  };
}
