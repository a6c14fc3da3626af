/**
 * The bench a board is photographed on: a painted or cast top, nothing that could pass for wood, with the board's shadow.
 *
 * Bench frame: the board's face frame carried straight down to the bench, mm.
 */
import { hashAt, roughNoise, smoothNoise } from "./noise";
import { between, type Random } from "./random";
import type { Tone } from "./species";

export interface Bench {
  readonly tone: Tone;
  /** Contrast of stains and of the surface's grain, as shares of brightness. */
  readonly stain: number;
  readonly speckle: number;
  readonly seed: number;
}

export interface Scratch {
  readonly fromMm: readonly [number, number];
  readonly toMm: readonly [number, number];
  /** Change of brightness along it, as a share. */
  readonly change: number;
}

const TONES: readonly Tone[] = [
  { r: 122, g: 125, b: 126 },
  { r: 99, g: 104, b: 107 },
  { r: 142, g: 141, b: 137 },
  { r: 96, g: 103, b: 98 },
];

/** A bench chosen by chance. */
export function chooseBench(seed: number, random: Random): Bench {
  const tone = TONES[Math.floor(random() * TONES.length)] ?? { r: 118, g: 124, b: 126 };
  return { tone, stain: between(random, 0.08, 0.14), speckle: between(random, 0.025, 0.05), seed };
}

/** Slow part of the bench's brightness, about 1: worth computing on a coarse grid only. */
export function benchStain(bench: Bench, xMm: number, yMm: number): number {
  const wide = smoothNoise(xMm / 260, yMm / 260, 0.5, bench.seed ^ 0x61);
  const middling = smoothNoise(xMm / 70, yMm / 70, 1.5, bench.seed ^ 0x62);
  const small = smoothNoise(xMm / 21, yMm / 21, 2.5, bench.seed ^ 0x63);
  const spot = Math.max(0, smoothNoise(xMm / 46, yMm / 46, 3.5, bench.seed ^ 0x64) - 0.62);
  return 1 + bench.stain * (1.1 * wide + 0.7 * middling + 0.4 * small) - 0.6 * spot;
}

/** Fine part of the bench's brightness, about 0: grains of 1 mm on a grit of 4 mm, with a paler chip of dust here and there. */
export function benchSpeckle(bench: Bench, xMm: number, yMm: number): number {
  const grain = hashAt(Math.floor(xMm), Math.floor(yMm), 9, bench.seed ^ 0x65);
  const grit = roughNoise(xMm / 4.1, yMm / 4.1, 0.5, bench.seed ^ 0x66);
  const dust = (grain & 1023) === 7 ? 0.2 : 0;
  return bench.speckle * (grain / 2147483648 + 0.7 * grit) + dust;
}

/** Scratches, scattered over a rectangle of the bench. */
export function benchScratches(
  random: Random,
  count: number,
  left: number,
  top: number,
  right: number,
  bottom: number,
): readonly Scratch[] {
  return Array.from({ length: count }, () => {
    const x = between(random, left, right);
    const y = between(random, top, bottom);
    const length = 20 + 260 * random() ** 3;
    const turn = random() * Math.PI;
    return {
      fromMm: [x, y] as const,
      toMm: [x + length * Math.cos(turn), y + length * Math.sin(turn)] as const,
      change: between(random, -0.1, 0.14),
    };
  });
}

/**
 * Share of light left on the bench beside a board whose top is `thicknessMm` above it and covers 0…L × 0…W: a soft shadow away from a lamp
 * at the top left, and the dark line where board and bench meet.
 */
export function shadowLeft(xMm: number, yMm: number, lengthMm: number, widthMm: number, thicknessMm: number): number {
  const cast = outside(xMm - 0.55 * thicknessMm, yMm - 0.9 * thicknessMm, lengthMm, widthMm);
  const touch = outside(xMm, yMm, lengthMm, widthMm);
  const soft = 1.1 * thicknessMm + 2;
  const lit = Math.min(1, Math.max(0, 0.5 + cast / soft));
  const gap = Math.exp(-Math.max(0, touch) / (0.45 * thicknessMm + 0.8));
  return (1 - 0.42 * (1 - lit * lit * (3 - 2 * lit))) * (1 - 0.38 * gap);
}

/** Signed distance from a rectangle at the origin, negative inside. */
function outside(x: number, y: number, lengthMm: number, widthMm: number): number {
  const dx = Math.max(-x, x - lengthMm);
  const dy = Math.max(-y, y - widthMm);
  return dx > 0 && dy > 0 ? Math.sqrt(dx * dx + dy * dy) : Math.max(dx, dy);
}
