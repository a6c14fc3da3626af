/**
 * Smooth and rough fields over space, made from an integer hash alone so that no table repeats along a three-metre board.
 */

const AXIS_X = 0x27d4eb2d;
const AXIS_Y = 0x165667b1;
const AXIS_Z = 0x9e3779b1 | 0;

function finish(mixed: number): number {
  let h = Math.imul(mixed ^ (mixed >>> 15), 0x85ebca6b);
  h = Math.imul(h ^ (h >>> 13), 0xc2b2ae35);
  return h ^ (h >>> 16);
}

/** 32 well-mixed bits for a lattice point, as a signed integer. */
export function hashAt(x: number, y: number, z: number, seed: number): number {
  return finish(Math.imul(x, AXIS_X) ^ Math.imul(y, AXIS_Y) ^ Math.imul(z, AXIS_Z) ^ seed);
}

function slope(hash: number, dx: number, dy: number, dz: number): number {
  return ((hash & 1023) - 511.5) * dx + (((hash >>> 10) & 1023) - 511.5) * dy + (((hash >>> 20) & 1023) - 511.5) * dz;
}

// Slopes run to ±511.5 a axis; with this factor the field stays within about ±1 and has a standard deviation near 0.3.
const SLOPE_SCALE = 1.35 / 511.5;

/** Gradient noise: smooth in value and in slope, mean 0, roughly within ±1, features about one unit apart. */
export function smoothNoise(x: number, y: number, z: number, seed: number): number {
  const ix = Math.floor(x);
  const iy = Math.floor(y);
  const iz = Math.floor(z);
  const fx = x - ix;
  const fy = y - iy;
  const fz = z - iz;
  const x0 = Math.imul(ix, AXIS_X) ^ seed;
  const x1 = Math.imul(ix + 1, AXIS_X) ^ seed;
  const y0 = Math.imul(iy, AXIS_Y);
  const y1 = Math.imul(iy + 1, AXIS_Y);
  const z0 = Math.imul(iz, AXIS_Z);
  const z1 = Math.imul(iz + 1, AXIS_Z);
  const u = fx * fx * fx * (fx * (fx * 6 - 15) + 10);
  const v = fy * fy * fy * (fy * (fy * 6 - 15) + 10);
  const w = fz * fz * fz * (fz * (fz * 6 - 15) + 10);
  const c000 = slope(finish(x0 ^ y0 ^ z0), fx, fy, fz);
  const c100 = slope(finish(x1 ^ y0 ^ z0), fx - 1, fy, fz);
  const c010 = slope(finish(x0 ^ y1 ^ z0), fx, fy - 1, fz);
  const c110 = slope(finish(x1 ^ y1 ^ z0), fx - 1, fy - 1, fz);
  const c001 = slope(finish(x0 ^ y0 ^ z1), fx, fy, fz - 1);
  const c101 = slope(finish(x1 ^ y0 ^ z1), fx - 1, fy, fz - 1);
  const c011 = slope(finish(x0 ^ y1 ^ z1), fx, fy - 1, fz - 1);
  const c111 = slope(finish(x1 ^ y1 ^ z1), fx - 1, fy - 1, fz - 1);
  const near0 = c000 + u * (c100 - c000);
  const near1 = c010 + u * (c110 - c010);
  const far0 = c001 + u * (c101 - c001);
  const far1 = c011 + u * (c111 - c011);
  const near = near0 + v * (near1 - near0);
  const far = far0 + v * (far1 - far0);
  return (near + w * (far - near)) * SLOPE_SCALE;
}

const VALUE_SCALE = 1 / 2147483648;

/** Value noise: cheaper and rougher than gradient noise, between −1 and 1; for fine fibre only, where its lattice cannot be seen. */
export function roughNoise(x: number, y: number, z: number, seed: number): number {
  const ix = Math.floor(x);
  const iy = Math.floor(y);
  const iz = Math.floor(z);
  const fx = x - ix;
  const fy = y - iy;
  const fz = z - iz;
  const x0 = Math.imul(ix, AXIS_X) ^ seed;
  const x1 = Math.imul(ix + 1, AXIS_X) ^ seed;
  const y0 = Math.imul(iy, AXIS_Y);
  const y1 = Math.imul(iy + 1, AXIS_Y);
  const z0 = Math.imul(iz, AXIS_Z);
  const z1 = Math.imul(iz + 1, AXIS_Z);
  const u = fx * fx * (3 - 2 * fx);
  const v = fy * fy * (3 - 2 * fy);
  const w = fz * fz * (3 - 2 * fz);
  const c000 = finish(x0 ^ y0 ^ z0);
  const c010 = finish(x0 ^ y1 ^ z0);
  const c001 = finish(x0 ^ y0 ^ z1);
  const c011 = finish(x0 ^ y1 ^ z1);
  const near0 = c000 + u * (finish(x1 ^ y0 ^ z0) - c000);
  const near1 = c010 + u * (finish(x1 ^ y1 ^ z0) - c010);
  const far0 = c001 + u * (finish(x1 ^ y0 ^ z1) - c001);
  const far1 = c011 + u * (finish(x1 ^ y1 ^ z1) - c011);
  const near = near0 + v * (near1 - near0);
  const far = far0 + v * (far1 - far0);
  return (near + w * (far - near)) * VALUE_SCALE;
}
