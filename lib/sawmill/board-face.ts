/**
 * Chooses where in a log a board is sawn, and shows its face.
 */

import { growLog, type Log } from "./log";
import type { FacePicture } from "./picture";
import { type Plane, planeFace, type Vector } from "./plane";
import { between, randomFor } from "./random";
import type { SpeciesKey } from "./species";

/** Flat: face along the rings, arches. Rift: across them at about 45°. Quarter: from pith to bark, lines. */
export type Cut = "flat" | "rift" | "quarter";

export interface BoardOptions {
  readonly species: SpeciesKey;
  readonly cut: Cut;
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly seed: number;
  /** Leave out every knot. */
  readonly clear?: boolean;
}

/** A board's log and the plane of its show face, seen from the bark side (flat) or from one side (rift, quarter). */
export interface SawnBoard {
  readonly log: Log;
  readonly plane: Plane;
  readonly lengthMm: number;
  readonly widthMm: number;
}

const BUTT_ROOM_MM = 100;
// The rim of a log is bark and wane; boards are taken inside this share of its radius.
const SOUND_SHARE = 0.97;

/** Saws a board: the seed settles the tree and the place of the board in it. Throws on a size that is no board. */
export function sawBoard(options: BoardOptions): SawnBoard {
  const { cut, lengthMm, widthMm, seed } = options;
  if (!(lengthMm > 0 && widthMm > 0)) throw new RangeError(`no board is ${lengthMm} mm long and ${widthMm} mm wide`);
  const random = randomFor(seed, "saw");
  const azimuth = random() * 2 * Math.PI;
  const outward: Vector = { x: Math.cos(azimuth), y: Math.sin(azimuth), z: 0 };
  const round: Vector = { x: -Math.sin(azimuth), y: Math.cos(azimuth), z: 0 };
  // Corner of the face, as distances outward and round; and the across direction as an angle from outward.
  const { out, side, turn } = placeInLog(cut, widthMm, random);
  const across = mix(outward, Math.cos(turn), round, Math.sin(turn));
  const corner = mix(outward, out, round, side);
  const far = Math.hypot(out + widthMm * Math.cos(turn), side + widthMm * Math.sin(turn));
  const log = growLog({
    species: options.species,
    seed,
    lengthMm,
    radiusMm: Math.max(far, Math.hypot(out, side)) / SOUND_SHARE,
    clear: options.clear ?? false,
  });
  // No saw runs quite true to the pith: a lean of a few thousandths keeps arches from standing in line.
  const lean = between(random, -0.004, 0.004);
  const norm = Math.hypot(1, lean);
  const along: Vector = {
    x: (Math.sin(turn) * outward.x - Math.cos(turn) * round.x) * (lean / norm),
    y: (Math.sin(turn) * outward.y - Math.cos(turn) * round.y) * (lean / norm),
    z: 1 / norm,
  };
  return { log, plane: { origin: { ...corner, z: BUTT_ROOM_MM }, along, across }, lengthMm, widthMm };
}

/** The face of the board that `sawBoard` gives, square on and to scale. */
export function boardFace(options: BoardOptions & { readonly pxPerMm: number }): FacePicture {
  const { log, plane, lengthMm, widthMm } = sawBoard(options);
  return planeFace(log, plane, { lengthMm, widthMm }, options.pxPerMm);
}

function placeInLog(cut: Cut, widthMm: number, random: () => number): { out: number; side: number; turn: number } {
  switch (cut) {
    case "flat":
      return { out: between(random, 80, 120), side: -widthMm * between(random, 0.4, 0.6), turn: Math.PI / 2 };
    case "quarter":
      return { out: between(random, 22, 34), side: between(random, -5, 5), turn: between(random, -0.03, 0.03) };
    case "rift": {
      const middle = between(random, 0.95, 1.1) * widthMm + 40;
      const half = widthMm / 2;
      return { out: middle - half * Math.SQRT1_2, side: -half * Math.SQRT1_2, turn: Math.PI / 4 };
    }
  }
}

function mix(a: Vector, shareA: number, b: Vector, shareB: number): Vector {
  return { x: a.x * shareA + b.x * shareB, y: a.y * shareA + b.y * shareB, z: a.z * shareA + b.z * shareB };
}
