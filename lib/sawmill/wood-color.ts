/**
 * The colour of planed wood at a place in the log: rings, heart and sap, pigment, fibre, pores, rays, or a branch's own wood.
 */
import type { Log, WoodPlace } from "./log";
import { hashAt, roughNoise, smoothNoise } from "./noise";
import { type RingPlace, readRing } from "./rings";
import type { Pores, Rays, Tone } from "./species";

/** Display values 0…255, not yet rounded. Written to by `woodColor`. */
export interface MutableTone {
  r: number;
  g: number;
  b: number;
}

const ring: RingPlace = { year: 0, share: 0, widthMm: 1, contrast: 1 };

function lean(color: MutableTone, to: Tone, share: number): void {
  color.r += (to.r - color.r) * share;
  color.g += (to.g - color.g) * share;
  color.b += (to.b - color.b) * share;
}

function scale(color: MutableTone, factor: number): void {
  color.r *= factor;
  color.g *= factor;
  color.b *= factor;
}

function ramp(from: number, to: number, value: number): number {
  const share = Math.min(1, Math.max(0, (value - from) / (to - from)));
  return share * share * (3 - 2 * share);
}

/** Colour of the wood at a place that `readLog` has filled. */
export function woodColor(log: Log, place: WoodPlace, color: MutableTone): void {
  if (place.branch >= 0) branchColor(log, place, color);
  else trunkColor(log, place, color);
}

function trunkColor(log: Log, place: WoodPlace, color: MutableTone): void {
  const { species, seed } = log;
  const { fibreX, fibreY, z } = place;
  const streak = smoothNoise(fibreX / 2.2, fibreY / 2.2, z / 160, seed ^ 0x21);
  // Fibres of one year do not all stop at one radius: this frays the tips of arches, where a face grazes the rings.
  const fray = species.frayMm * (streak + 0.6 * smoothNoise(fibreX / 1.6, fibreY / 1.6, z / 45, seed ^ 0x26));
  readRing(log.rings, place.growthMm + fray, ring);

  // Early to late: a rise that begins where latewood does, then a drop within 0.2 mm as the next spring starts.
  const lateFrom = 1 - species.lateShare;
  const rise = ramp(
    lateFrom - (1 - species.lateOnset) * lateFrom * 0.8,
    1 - (1 - species.lateOnset) * species.lateShare * 0.4,
    ring.share,
  );
  const spring = ramp(0, 0.22, ring.share * ring.widthMm);
  const lateness = (rise * spring + (1 - spring)) * ring.contrast;

  color.r = species.early.r;
  color.g = species.early.g;
  color.b = species.early.b;
  lean(color, species.late, Math.min(1.25, Math.max(0, lateness + 0.25 * streak)));

  const cloud = smoothNoise(place.growthMm / 13, fibreX / 70, z / 900 + fibreY / 70, seed ^ 0x22);
  const band = smoothNoise(place.growthMm / 4.5, fibreX / 160, z / 1500, seed ^ 0x23);
  const sap = ramp(
    -species.sapBlendMm / 2,
    species.sapBlendMm / 2,
    place.growthMm - (log.radiusMm - species.sapDepthMm) - species.taper * z * 0.6 - 5 * cloud,
  );
  const pigment = species.pigment * Math.max(0, 0.28 + 1.9 * cloud + 0.8 * band) * (1 - 0.7 * sap);
  lean(color, species.pigmentTone, Math.min(0.85, pigment));
  if (sap > 0) {
    const depth = species.sapContrast * lateness;
    color.r += (species.sap.r + (species.late.r - species.early.r) * depth - color.r) * sap * 0.92;
    color.g += (species.sap.g + (species.late.g - species.early.g) * depth - color.g) * sap * 0.92;
    color.b += (species.sap.b + (species.late.b - species.early.b) * depth - color.b) * sap * 0.92;
  }

  const fine = roughNoise(fibreX / 0.34, fibreY / 0.34, z / 14, seed ^ 0x24);
  // Shimmer comes in patches: a slow field decides where the quick one shows.
  const patch = Math.max(0, 0.25 + 1.2 * cloud);
  const shimmer = patch * smoothNoise(fibreX / 14, fibreY / 14, z / 19, seed ^ 0x25);
  scale(color, 1 + species.fibre * (0.8 * fine + 1.1 * streak) + species.shimmer * shimmer);
  if (place.strain > 0) lean(color, species.branching.tone, 0.38 * place.strain * place.strain);

  if (species.rays !== null) rayColor(species.rays, seed, place, color);
  if (species.pores !== null) poreColor(species.pores, seed, place, color, sap);
}

/** Vessels: one tube in each cell across the fibres, open along stretches of its length, its width set by the season. */
function poreColor(pores: Pores, seed: number, place: WoodPlace, color: MutableTone, sap: number): void {
  const early = 1 - ramp(pores.earlyShare * 0.75, pores.earlyShare * 1.25, ring.share);
  const radius = pores.lateRadiusMm + (pores.earlyRadiusMm - pores.lateRadiusMm) * early;
  if (radius < 0.015) return;
  // Cells stand askew to the log's axes and each column is shifted, so that no face runs along their borders.
  const u = (place.fibreX * 0.8 + place.fibreY * 0.6) / pores.pitchMm;
  const column = Math.floor(u);
  const shift = hashAt(column, 3, 5, seed ^ 0x31) / 4294967296;
  const v = (place.fibreY * 0.8 - place.fibreX * 0.6) / pores.pitchMm + shift;
  const row = Math.floor(v);
  const cell = hashAt(column, row, 11, seed ^ 0x32);
  const along = place.z / pores.lengthMm + (cell & 255) / 256;
  const stretch = Math.floor(along);
  const open = hashAt(column, row, stretch, seed ^ 0x33);
  if ((open & 3) === 0) return;
  const size = radius * (0.7 + ((open >>> 4) & 255) / 425);
  const room = Math.max(0.02, 0.5 - size / pores.pitchMm);
  const offU = (u - column - 0.5 - room * (((cell >>> 8) & 255) / 127.5 - 1)) * pores.pitchMm;
  const offV = (v - row - 0.5 - room * (((cell >>> 16) & 255) / 127.5 - 1)) * pores.pitchMm;
  const inside = (size - Math.sqrt(offU * offU + offV * offV)) / 0.1 + 0.5;
  if (inside <= 0) return;
  const end = along - stretch;
  const taper = Math.min(1, 6 * Math.min(end, 1 - end));
  lean(color, pores.tone, Math.min(1, inside) * taper * pores.depth * (1 - 0.45 * sap));
}

/** Rays: thin upright ribbons from pith to bark; broad on a face that runs along them, short lines on one that crosses. */
function rayColor(rays: Rays, seed: number, place: WoodPlace, color: MutableTone): void {
  const turn = Math.atan2(place.fibreY, place.fibreX) / (2 * Math.PI) + 0.5;
  const sway = smoothNoise(place.growthMm / 60, place.z / 120, 7.5, seed ^ 0x41);
  const at = turn * rays.around + 1.6 * sway;
  const column = Math.floor(at);
  const wrapped = ((column % rays.around) + rays.around) % rays.around;
  const across = Math.abs(at - column - 0.5) * 2;
  const kind = hashAt(wrapped, 1, 2, seed ^ 0x42);
  const height = 0.6 + (kind & 255) / 200;
  const level =
    smoothNoise(
      place.growthMm / rays.radialMm,
      place.z / (rays.heightMm * height) + (kind >>> 8) / 1e4,
      wrapped * 1.37,
      seed ^ 0x43,
    ) +
    0.25 * smoothNoise(place.growthMm / 3, place.z / 5, wrapped * 1.37, seed ^ 0x44);
  const presence = ramp(rays.threshold, rays.threshold + 0.12, level - 0.25 * across * across);
  if (presence <= 0) return;
  // The ribbon's core is bright; its borders, which are most of what a flat-sawn face shows of it, are dull.
  if (across < 0.55) lean(color, rays.tone, presence * 0.68);
  else lean(color, rays.borderTone, presence * 0.3);
}

/** A branch's own wood: its rings seen on end, darker to the rim, in bark and split where it had died. */
function branchColor(log: Log, place: WoodPlace, color: MutableTone): void {
  const { branching } = log.species;
  const branch = log.branches[place.branch];
  const seed = log.seed + place.branch * 977;
  const { offSideMm, offLiftMm, offAxisMm } = place;
  const share = offAxisMm / place.branchRadiusMm;
  const along = place.alongBranchMm / 60;
  const rough = smoothNoise(offSideMm / 3.5, offLiftMm / 3.5, along, seed ^ 0x51);
  const fine = roughNoise(offSideMm / 0.5, offLiftMm / 0.5, place.alongBranchMm / 3, seed ^ 0x52);
  // Rings of about 1.1 mm, not quite round and not quite even.
  const rings = smoothNoise((offAxisMm + 1.3 * rough) * 1.7, 0.5, along, seed ^ 0x53);
  color.r = branching.tone.r;
  color.g = branching.tone.g;
  color.b = branching.tone.b;
  scale(color, 1.08 + 0.26 * rings + 0.16 * rough + 0.07 * fine - 0.14 * share);
  const dead = branch !== undefined && place.alongBranchMm > branch.deadFromMm;
  const rim = ramp(dead ? 0.78 : 0.7, 1, share + 0.1 * rough);
  lean(color, branching.rim, (dead ? 0.22 : 0) + rim * (dead ? 0.72 : 0.42));
  if (dead) {
    // One drying check through the middle, wandering a little.
    const turn = hashAt(place.branch, 1, 1, seed) / 683565276;
    const off = offSideMm * Math.cos(turn) + offLiftMm * Math.sin(turn) + 0.12 * place.branchRadiusMm * rough;
    const open = 1 - ramp(0.12, 0.45 + 0.03 * place.branchRadiusMm, Math.abs(off));
    lean(color, branching.rim, 0.85 * open * (1 - ramp(0.55, 0.9, share)));
  } else {
    lean(color, branching.rim, 0.4 * (1 - ramp(0.3, 1.1, offAxisMm)));
  }
}
