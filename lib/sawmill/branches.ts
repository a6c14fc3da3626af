/**
 * Branches, which a saw shows as knots: cones that start at the pith, rise outwards and push the trunk's grain aside.
 */
import { between, type Random, randomFor } from "./random";
import type { Branching } from "./species";

export interface Branch {
  /** Height of its root at the pith. */
  readonly rootZMm: number;
  /** Direction away from the pith, as a unit vector across the log. */
  readonly outX: number;
  readonly outY: number;
  /** Share of the axis's unit vector that points out and up. */
  readonly out: number;
  readonly up: number;
  /** Growth in radius per millimetre along the axis. */
  readonly flare: number;
  /** Where along the axis the branch broke off and was grown over. */
  readonly endMm: number;
  /** From here on it was dead wood in its bark; equals `endMm` for a live branch. */
  readonly deadFromMm: number;
}

/** Trunk wood within this many branch radii along the grain is still bent by it. */
export const BRANCH_REACH = 9;

/** Branches of a log in whorls up its length, in order of height. */
export function growBranches(branching: Branching, lengthMm: number, radiusMm: number, seed: number): readonly Branch[] {
  const random = randomFor(seed, "branches");
  const branches: Branch[] = [];
  for (
    let z = between(random, 0.2, 0.9) * branching.whorlMm;
    z < lengthMm;
    z += branching.whorlMm * between(random, 0.65, 1.35)
  ) {
    const count = 1 + Math.floor(random() * branching.mostPerWhorl);
    const turn = random() * 2 * Math.PI;
    for (let i = 0; i < count; i++) {
      branches.push(
        growBranch(branching, z, turn + ((i + between(random, -0.25, 0.25)) * 2 * Math.PI) / count, radiusMm, random),
      );
    }
  }
  return branches.sort((a, b) => a.rootZMm - b.rootZMm || a.outX - b.outX || a.outY - b.outY);
}

function growBranch(branching: Branching, z: number, azimuth: number, radiusMm: number, random: Random): Branch {
  const rise = between(random, 0.25, 0.75);
  const endMm = radiusMm * between(random, 0.55, 1.3);
  const dead = random() < branching.deadShare;
  return {
    rootZMm: z + between(random, -25, 25),
    outX: Math.cos(azimuth),
    outY: Math.sin(azimuth),
    out: Math.cos(rise),
    up: Math.sin(rise),
    flare: between(random, branching.flare[0], branching.flare[1]),
    endMm,
    deadFromMm: dead ? endMm * between(random, 0.3, 0.6) : endMm,
  };
}

// However long it lives, a branch grows no thicker than about this.
const MOST_RADIUS_MM = 17;

/** Radius of the branch at a distance along its axis: a cone at first, slower as it thickens; a dead branch grows no more. */
export function branchRadiusMm(branch: Branch, alongMm: number): number {
  const cone = branch.flare * Math.min(alongMm, branch.deadFromMm);
  return 1.2 + MOST_RADIUS_MM * (1 - Math.exp(-cone / MOST_RADIUS_MM));
}

/** Share of that radius left on the last stretch, where the stub was worn round before it was grown over; 0 past its end. */
export function stubShare(branch: Branch, alongMm: number): number {
  const left = (branch.endMm - alongMm) / branchRadiusMm(branch, branch.endMm);
  if (left <= 0) return 0;
  return left >= 1 ? 1 : Math.sqrt(left * (2 - left));
}
