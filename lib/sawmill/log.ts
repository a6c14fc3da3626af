/**
 * One tree trunk as a field: every point of space has a growth radius, a place along and across its fibres, and perhaps a branch.
 * All faces sawn from a log ask this one field, so they agree wherever they meet.
 *
 * Log frame: z up the tree from the butt, x and y across it, origin at the mean pith. Millimetres.
 */
import { BRANCH_REACH, type Branch, branchRadiusMm, growBranches, stubShare } from "./branches";
import { smoothNoise } from "./noise";
import { between, randomFor } from "./random";
import { growRings, type Rings } from "./rings";
import { type Species, type SpeciesKey, speciesLooks } from "./species";

export interface Log {
  readonly species: Species;
  readonly seed: number;
  readonly radiusMm: number;
  readonly lengthMm: number;
  readonly rings: Rings;
  readonly branches: readonly Branch[];
  /** Pith position every `PITH_STEP_MM` up the log: x and y in turn. */
  readonly pith: Float64Array;
}

export interface LogOptions {
  readonly species: SpeciesKey;
  readonly seed: number;
  /** Longest board wanted; the log grows a little beyond it. */
  readonly lengthMm: number;
  /** Least radius wanted; the species' own is used when that is larger. */
  readonly radiusMm?: number;
  /** Leave out every branch. */
  readonly clear?: boolean;
}

/** What the field says about a point. Written to by `readLog`, so that millions of points cost no allocation. */
export interface WoodPlace {
  /** Radius the tree had when this wood grew, measured at the butt. */
  growthMm: number;
  /** Place across the fibres, constant along one fibre. */
  fibreX: number;
  fibreY: number;
  z: number;
  /** Branch whose own wood this is, or −1. */
  branch: number;
  /** Offsets from that branch's axis, sideways and up, their length, and the branch's radius there. */
  offSideMm: number;
  offLiftMm: number;
  offAxisMm: number;
  branchRadiusMm: number;
  /** Place along that branch's axis. */
  alongBranchMm: number;
  /** 0 far from every branch, 1 against one. */
  strain: number;
}

/** An empty place to hand to `readLog`. */
export function emptyPlace(): WoodPlace {
  return {
    growthMm: 0,
    fibreX: 0,
    fibreY: 0,
    z: 0,
    branch: -1,
    offSideMm: 0,
    offLiftMm: 0,
    offAxisMm: 0,
    branchRadiusMm: 0,
    alongBranchMm: 0,
    strain: 0,
  };
}

const PITH_STEP_MM = 2;
// Room at both ends for planes that lean a little and for sampling just past a face's edge.
const END_ROOM_MM = 100;

/** A log grown from its seed. */
export function growLog(options: LogOptions): Log {
  const species = speciesLooks[options.species];
  const radiusMm = Math.max(species.radiusMm, options.radiusMm ?? 0);
  const lengthMm = options.lengthMm + 2 * END_ROOM_MM;
  // Taper adds to the growth radius up the log, so the rings must reach further than the butt's own radius.
  const grownMm = radiusMm + species.taper * lengthMm + 4 * species.waveMm;
  return {
    species,
    seed: options.seed,
    radiusMm,
    lengthMm,
    rings: growRings(species.ringMm, species.ringSpread, grownMm, randomFor(options.seed, "rings")),
    branches: options.clear ? [] : growBranches(species.branching, lengthMm, radiusMm, options.seed),
    pith: growPith(species.wanderMm, lengthMm, options.seed),
  };
}

function growPith(wanderMm: number, logMm: number, seed: number): Float64Array {
  const random = randomFor(seed, "pith");
  // Length and share of the whole wander. The long waves stay gentle: steeper than the taper they would turn arches into long blots.
  const waves = (
    [
      [2400, 0.55],
      [1300, 0.4],
      [640, 0.26],
      [330, 0.14],
    ] as const
  ).map(([lengthMm, share]) => ({
    turnsPerMm: 1 / (lengthMm * between(random, 0.8, 1.2)),
    x: wanderMm * share * between(random, 0.5, 1),
    y: wanderMm * share * between(random, 0.5, 1),
    startX: random(),
    startY: random(),
  }));
  const steps = Math.ceil(logMm / PITH_STEP_MM) + 2;
  const pith = new Float64Array(steps * 2);
  for (let i = 0; i < steps; i++) {
    for (const wave of waves) {
      const turns = i * PITH_STEP_MM * wave.turnsPerMm;
      pith[2 * i] = (pith[2 * i] ?? 0) + wave.x * Math.sin(2 * Math.PI * (turns + wave.startX));
      pith[2 * i + 1] = (pith[2 * i + 1] ?? 0) + wave.y * Math.sin(2 * Math.PI * (turns + wave.startY));
    }
  }
  return pith;
}

/** Indices of the branches that can touch wood between two heights. */
export function branchesNear(log: Log, fromZ: number, toZ: number): number[] {
  const near: number[] = [];
  log.branches.forEach((branch, i) => {
    const tip = branch.rootZMm + branch.endMm * branch.up;
    const reach = BRANCH_REACH * branchRadiusMm(branch, branch.endMm);
    if (branch.rootZMm - reach < toZ && tip + reach > fromZ) near.push(i);
  });
  return near;
}

// Scratch of one reading, kept here because a photograph takes millions of them.
const pithHere = { x: 0, y: 0 };
const bent = { x: 0, y: 0, youngerMm: 0 };

/** The pith's place at a height, straight between the steps it was grown in. Fills and returns `into`. */
export function pithAt(log: Log, z: number, into: { x: number; y: number } = { x: 0, y: 0 }): { x: number; y: number } {
  const step = Math.min(Math.max(z / PITH_STEP_MM, 0), log.pith.length / 2 - 1.001);
  const below = Math.floor(step) * 2;
  const share = step - Math.floor(step);
  into.x = (log.pith[below] ?? 0) * (1 - share) + (log.pith[below + 2] ?? 0) * share;
  into.y = (log.pith[below + 1] ?? 0) * (1 - share) + (log.pith[below + 3] ?? 0) * share;
  return into;
}

/**
 * Reads the field at (x, y, z). `near` must hold every branch that `branchesNear` names for this height.
 *
 * Growth radius = distance from the pith, bent aside round branches, plus taper times height, plus waves of three sizes.
 */
export function readLog(log: Log, x: number, y: number, z: number, near: readonly number[], place: WoodPlace): void {
  const { species, seed } = log;
  pithAt(log, z, pithHere);
  bent.x = x - pithHere.x;
  bent.y = y - pithHere.y;
  bent.youngerMm = 0;
  place.z = z;
  place.branch = -1;
  place.strain = 0;
  for (const index of near) {
    const branch = log.branches[index];
    if (branch !== undefined) meetBranch(branch, index, z, seed, place);
  }

  const radius = Math.sqrt(bent.x * bent.x + bent.y * bent.y);
  const wave =
    2.2 * smoothNoise(x / 120, y / 120, z / 520, seed ^ 0x11) +
    smoothNoise(x / 34, y / 34, z / 170, seed ^ 0x12) +
    0.22 * smoothNoise(x / 8, y / 8, z / 40, seed ^ 0x13);
  const growth = radius + species.taper * z + species.waveMm * wave * Math.min(1, radius / 40) - bent.youngerMm;
  const spread = growth / Math.max(radius, 2);
  place.growthMm = growth;
  place.fibreX = bent.x * spread;
  place.fibreY = bent.y * spread;
}

/** Notes whether the point lies in this branch, and bends the trunk's grain round it. */
function meetBranch(branch: Branch, index: number, z: number, seed: number, place: WoodPlace): void {
  const outward = bent.x * branch.outX + bent.y * branch.outY;
  const rise = z - branch.rootZMm;
  const along = outward * branch.out + rise * branch.up;
  if (along <= 0) return;
  const radius = branchRadiusMm(branch, along);
  const reach = BRANCH_REACH * radius;
  const side = bent.y * branch.outX - bent.x * branch.outY;
  // Offset from the axis within the plane that holds axis and trunk, square to the axis.
  const lift = rise * branch.out - outward * branch.up;
  const offAxis = Math.sqrt(side * side + lift * lift);
  if (offAxis >= reach) return;
  if (along < branch.endMm && offAxis < radius * 1.3) {
    // No branch is quite round: its outline swells and shrinks by up to three tenths.
    const swell = 1 + 0.3 * smoothNoise((1.1 * side) / radius, (1.1 * lift) / radius, along / 50, seed ^ (index + 0x100));
    const outline = radius * swell * stubShare(branch, along);
    if (offAxis < outline && (place.branch < 0 || offAxis * place.branchRadiusMm < place.offAxisMm * outline)) {
      place.branch = index;
      place.offSideMm = side;
      place.offLiftMm = lift;
      place.offAxisMm = offAxis;
      place.branchRadiusMm = outline;
      place.alongBranchMm = along;
    }
  }
  const healed = along < branch.endMm ? 1 : 1 - (along - branch.endMm) / (4 * radius);
  if (healed <= 0) return;
  // Grain parts round the branch as water round a pile, drawn out along the trunk, and is straight again where its reach ends.
  const drawn = side * side + 0.16 * lift * lift;
  const window = 1 - (offAxis * offAxis) / (reach * reach);
  const push = (healed * window * window * 1.1 * radius * radius) / (drawn + 1.1 * radius * radius);
  bent.x += branch.outY * side * push;
  bent.y -= branch.outX * side * push;
  // Each year's growth runs out along the branch a little way: next to it the wood is younger than its distance says.
  const gap = Math.max(0, Math.sqrt(drawn) - 0.6 * radius);
  const closeness = healed * window * Math.exp(-gap / (0.75 * radius));
  bent.youngerMm += closeness * radius * 0.9;
  place.strain = Math.max(place.strain, closeness);
}
