/** The sizes of a straightened picture's levels: the full one, then halves, for fast zooming. Holds no pixels. */

export interface LevelSize {
  /** 0 is the full picture; level n is 2ⁿ times smaller. */
  readonly level: number;
  readonly width: number;
  readonly height: number;
}

/** Halving stops at the first level whose long side is no longer than this, px. */
export const SMALLEST_LEVEL_PX = 600;

/** Levels from the full size down, rounded up so that no row or column is lost; at least one. */
export function pyramidLevels(width: number, height: number, smallestPx: number = SMALLEST_LEVEL_PX): readonly LevelSize[] {
  const levels: LevelSize[] = [];
  for (let level = 0; ; level++) {
    const size = { level, width: Math.ceil(width / 2 ** level), height: Math.ceil(height / 2 ** level) };
    levels.push(size);
    if (Math.max(size.width, size.height) <= Math.max(1, smallestPx)) return levels;
  }
}
