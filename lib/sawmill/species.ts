/**
 * What tells one wood from another: colours, rings, pores, rays, knots, as plain numbers. Chosen by eye for a screen;
 * none of these figures is a property to be relied on at the bench.
 */

/** Display (sRGB) values 0…255. */
export interface Tone {
  readonly r: number;
  readonly g: number;
  readonly b: number;
}

export interface Pores {
  /** Spacing of vessels across the grain. */
  readonly pitchMm: number;
  /** Vessel radius at the start and at the end of a year's growth; zero means none. */
  readonly earlyRadiusMm: number;
  readonly lateRadiusMm: number;
  /** Share of a year's growth that carries the early vessels. */
  readonly earlyShare: number;
  /** Length of the open stretch of a vessel along the grain. */
  readonly lengthMm: number;
  /** How much of an open vessel's colour shows, 0…1. */
  readonly depth: number;
  readonly tone: Tone;
}

export interface Rays {
  /** Whole number of ray places round the log, so that the pattern closes on itself. */
  readonly around: number;
  readonly radialMm: number;
  readonly heightMm: number;
  /** Level of a noise of ±1 above which a ray is present: higher is sparser. */
  readonly threshold: number;
  readonly tone: Tone;
  readonly borderTone: Tone;
}

export interface Branching {
  /** Mean distance between whorls of branches along the log. */
  readonly whorlMm: number;
  readonly mostPerWhorl: number;
  /** Growth in radius per millimetre away from the pith. */
  readonly flare: readonly [number, number];
  /** Share of branches that died and were grown over with their bark. */
  readonly deadShare: number;
  readonly tone: Tone;
  readonly rim: Tone;
}

export interface Species {
  readonly name: string;
  readonly radiusMm: number;
  readonly ringMm: number;
  /** Spread of ring widths as a share of the mean. */
  readonly ringSpread: number;
  /** Share of a ring that is latewood. */
  readonly lateShare: number;
  /** 0 = latewood fades in over the whole ring, 1 = it starts at once. */
  readonly lateOnset: number;
  readonly early: Tone;
  readonly late: Tone;
  readonly sap: Tone;
  readonly sapDepthMm: number;
  /** Width over which heartwood passes into sapwood, and how much of the rings' contrast sapwood keeps. */
  readonly sapBlendMm: number;
  readonly sapContrast: number;
  /** Bands of heartwood colour over several years: strength 0…1 and the colour they lean to. */
  readonly pigment: number;
  readonly pigmentTone: Tone;
  /** Contrast of fine fibre, as a share of brightness. */
  readonly fibre: number;
  /** Contrast of the shimmer across the grain that slanting fibres give. */
  readonly shimmer: number;
  /** Loss of radius per millimetre up the tree. */
  readonly taper: number;
  readonly wanderMm: number;
  /** How far fibres of one year stray from its radius: frays arches. */
  readonly frayMm: number;
  readonly waveMm: number;
  readonly pores: Pores | null;
  readonly rays: Rays | null;
  readonly branching: Branching;
}

const walnut: Species = {
  name: "black walnut",
  radiusMm: 225,
  ringMm: 4.2,
  ringSpread: 0.34,
  lateShare: 0.42,
  lateOnset: 0.25,
  early: { r: 160, g: 122, b: 93 },
  late: { r: 112, g: 79, b: 58 },
  sap: { r: 208, g: 182, b: 148 },
  sapDepthMm: 24,
  sapBlendMm: 4,
  sapContrast: 0.3,
  pigment: 0.6,
  pigmentTone: { r: 80, g: 56, b: 44 },
  fibre: 0.08,
  shimmer: 0.05,
  taper: 0.016,
  wanderMm: 4,
  frayMm: 0.45,
  waveMm: 1.7,
  pores: {
    pitchMm: 0.85,
    earlyRadiusMm: 0.13,
    lateRadiusMm: 0.06,
    earlyShare: 0.5,
    lengthMm: 9,
    depth: 0.72,
    tone: { r: 54, g: 36, b: 28 },
  },
  rays: null,
  branching: {
    whorlMm: 900,
    mostPerWhorl: 2,
    flare: [0.07, 0.13],
    deadShare: 0.3,
    tone: { r: 104, g: 73, b: 54 },
    rim: { r: 46, g: 31, b: 25 },
  },
};

const oak: Species = {
  name: "white oak",
  radiusMm: 260,
  ringMm: 3.2,
  ringSpread: 0.3,
  lateShare: 0.6,
  lateOnset: 0.6,
  early: { r: 181, g: 145, b: 103 },
  late: { r: 203, g: 171, b: 129 },
  sap: { r: 220, g: 198, b: 160 },
  sapDepthMm: 20,
  sapBlendMm: 5,
  sapContrast: 0.8,
  pigment: 0.5,
  pigmentTone: { r: 154, g: 116, b: 78 },
  fibre: 0.06,
  shimmer: 0.03,
  taper: 0.014,
  wanderMm: 4,
  frayMm: 0.4,
  waveMm: 1.2,
  pores: {
    pitchMm: 0.5,
    earlyRadiusMm: 0.17,
    lateRadiusMm: 0.03,
    earlyShare: 0.32,
    lengthMm: 11,
    depth: 0.62,
    tone: { r: 104, g: 74, b: 48 },
  },
  rays: {
    around: 1300,
    radialMm: 42,
    heightMm: 6.5,
    threshold: 0.24,
    tone: { r: 219, g: 192, b: 151 },
    borderTone: { r: 138, g: 100, b: 66 },
  },
  branching: {
    whorlMm: 1400,
    mostPerWhorl: 1,
    flare: [0.05, 0.09],
    deadShare: 0.3,
    tone: { r: 134, g: 96, b: 60 },
    rim: { r: 74, g: 52, b: 34 },
  },
};

const cherry: Species = {
  name: "black cherry",
  radiusMm: 210,
  ringMm: 3.8,
  ringSpread: 0.35,
  lateShare: 0.35,
  lateOnset: 0.2,
  early: { r: 199, g: 152, b: 110 },
  late: { r: 168, g: 117, b: 79 },
  sap: { r: 226, g: 198, b: 158 },
  sapDepthMm: 18,
  sapBlendMm: 4,
  sapContrast: 0.45,
  pigment: 0.55,
  pigmentTone: { r: 158, g: 108, b: 78 },
  fibre: 0.04,
  shimmer: 0.06,
  taper: 0.015,
  wanderMm: 4,
  frayMm: 0.35,
  waveMm: 1.5,
  pores: {
    pitchMm: 0.6,
    earlyRadiusMm: 0.06,
    lateRadiusMm: 0.045,
    earlyShare: 0.4,
    lengthMm: 4,
    depth: 0.4,
    tone: { r: 112, g: 66, b: 42 },
  },
  rays: {
    around: 2200,
    radialMm: 4,
    heightMm: 2.2,
    threshold: 0.42,
    tone: { r: 206, g: 152, b: 112 },
    borderTone: { r: 138, g: 100, b: 66 },
  },
  branching: {
    whorlMm: 1000,
    mostPerWhorl: 1,
    flare: [0.04, 0.07],
    deadShare: 0.4,
    tone: { r: 126, g: 74, b: 46 },
    rim: { r: 58, g: 34, b: 24 },
  },
};

const ash: Species = {
  name: "ash",
  radiusMm: 220,
  ringMm: 4,
  ringSpread: 0.33,
  lateShare: 0.6,
  lateOnset: 0.5,
  early: { r: 208, g: 180, b: 138 },
  late: { r: 225, g: 203, b: 167 },
  sap: { r: 230, g: 210, b: 176 },
  sapDepthMm: 70,
  sapBlendMm: 22,
  sapContrast: 0.9,
  pigment: 0.5,
  pigmentTone: { r: 186, g: 154, b: 114 },
  fibre: 0.045,
  shimmer: 0.035,
  taper: 0.016,
  wanderMm: 4,
  frayMm: 0.45,
  waveMm: 1.7,
  pores: {
    pitchMm: 0.42,
    earlyRadiusMm: 0.15,
    lateRadiusMm: 0.02,
    earlyShare: 0.34,
    lengthMm: 8,
    depth: 0.55,
    tone: { r: 142, g: 108, b: 68 },
  },
  rays: null,
  branching: {
    whorlMm: 1300,
    mostPerWhorl: 1,
    flare: [0.05, 0.09],
    deadShare: 0.2,
    tone: { r: 160, g: 120, b: 80 },
    rim: { r: 92, g: 64, b: 42 },
  },
};

const pine: Species = {
  name: "pine",
  radiusMm: 190,
  ringMm: 3.6,
  ringSpread: 0.4,
  lateShare: 0.3,
  lateOnset: 0.35,
  early: { r: 234, g: 208, b: 160 },
  late: { r: 205, g: 155, b: 100 },
  sap: { r: 237, g: 214, b: 170 },
  sapDepthMm: 55,
  sapBlendMm: 14,
  sapContrast: 0.95,
  pigment: 0.22,
  pigmentTone: { r: 214, g: 168, b: 112 },
  fibre: 0.035,
  shimmer: 0.03,
  taper: 0.014,
  wanderMm: 3.5,
  frayMm: 0.24,
  waveMm: 1.1,
  pores: {
    pitchMm: 2.6,
    earlyRadiusMm: 0.0,
    lateRadiusMm: 0.09,
    earlyShare: 0.55,
    lengthMm: 5,
    depth: 0.35,
    tone: { r: 150, g: 96, b: 52 },
  },
  rays: null,
  branching: {
    whorlMm: 340,
    mostPerWhorl: 5,
    flare: [0.07, 0.15],
    deadShare: 0.4,
    tone: { r: 168, g: 112, b: 66 },
    rim: { r: 84, g: 48, b: 28 },
  },
};

/** The woods the sawmill can grow. */
export const speciesLooks = { walnut, oak, cherry, ash, pine } as const;

export type SpeciesKey = keyof typeof speciesLooks;
