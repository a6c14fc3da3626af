/** Pictures of wood that never grew: lines of a known figure at a known slope, so that every reading has one right answer. */
import type { StockPicture } from "@/lib/layout";
import { bell, between, type Random, randomFor } from "@/lib/sawmill/random";

/** Brightness at a place across the grain, about −1…1. */
export type Figure = (mm: number) => number;

/** Ripples of 3 to 16 mm that never come again within a board. */
export function randomFigure(seed: number): Figure {
  const random = randomFor(seed, "drawn figure");
  const waves = Array.from({ length: 9 }, (_, i) => ({
    perMm: (2 * Math.PI) / (3 * (16 / 3) ** ((i + random()) / 9)),
    phase: between(random, 0, 2 * Math.PI),
    height: between(random, 0.15, 0.45),
  }));
  return (mm) => waves.reduce((sum, { perMm, phase, height }) => sum + height * Math.sin(perMm * mm + phase), 0);
}

export interface DrawnWood {
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly pxPerMm: number;
  readonly figure: Figure;
  /** How far lines sink for every millimetre along the grain. */
  readonly slope?: number;
  /** Standard deviation of noise, grey values; 2 unless given. */
  readonly noise?: number;
  readonly seed?: number;
  readonly channels?: 3 | 4;
  /** Makes marks and knots: grey value at a place, given what the figure has there. */
  readonly over?: (xMm: number, yMm: number, grey: number) => number;
}

/** Lines y − slope·x = constant, grey 130 ± 40. */
export function drawnWood(wood: DrawnWood): StockPicture {
  const {
    lengthMm,
    widthMm,
    pxPerMm,
    figure,
    slope = 0,
    noise = 2,
    seed = 1,
    channels = 3,
    over = (_x, _y, grey) => grey,
  } = wood;
  const width = Math.round(lengthMm * pxPerMm);
  const height = Math.round(widthMm * pxPerMm);
  const random = noiseFrom(seed);
  const line = tabulated(figure, -Math.abs(slope) * lengthMm, widthMm + Math.abs(slope) * lengthMm);
  const data = new Uint8Array(width * height * channels).fill(255);
  for (let y = 0, at = 0; y < height; y++) {
    for (let x = 0; x < width; x++, at += channels) {
      const [xMm, yMm] = [(x + 0.5) / pxPerMm, (y + 0.5) / pxPerMm];
      const grey = over(xMm, yMm, 130 + 40 * line(yMm - slope * xMm)) + noise * random();
      data.fill(Math.max(0, Math.min(255, Math.round(grey))), at, at + 3);
    }
  }
  return { pixels: { data, width, height, channels }, pxPerMm };
}

/** A figure worked out every twentieth of a millimetre and straight in between: pictures ask for each value a hundred times. */
function tabulated(figure: Figure, fromMm: number, toMm: number): Figure {
  const values = Float64Array.from({ length: Math.ceil((toMm - fromMm) * 20) + 2 }, (_, i) => figure(fromMm + i / 20));
  return (mm) => {
    const at = (mm - fromMm) * 20;
    const below = Math.floor(at);
    const low = values[below] as number;
    return low + ((values[below + 1] as number) - low) * (at - below);
  };
}

/** Bell-shaped numbers, taken from a table at random because making each anew takes longer than all the rest. */
function noiseFrom(seed: number): Random {
  const random = randomFor(seed, "drawn noise");
  const values = Float64Array.from({ length: 4096 }, () => bell(random));
  return () => values[Math.floor(random() * 4096)] as number;
}
