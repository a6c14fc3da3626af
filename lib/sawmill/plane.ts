/**
 * Cuts a plane through a log and gives its face as a picture.
 *
 * Face frame: origin at the face's corner, x along the grain, y across, seen from outside the piece; `inward` points away from the viewer.
 */
import { branchesNear, emptyPlace, type Log, readLog } from "./log";
import type { FacePicture } from "./picture";
import { type MutableTone, woodColor } from "./wood-color";

export interface Vector {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

/** A face's corner in the log frame (mm) and the unit vectors along and across it. */
export interface Plane {
  readonly origin: Vector;
  readonly along: Vector;
  readonly across: Vector;
}

export interface FaceSize {
  readonly lengthMm: number;
  readonly widthMm: number;
}

/** Sum of a point and a vector taken `times` over. */
export function offset(point: Vector, by: Vector, times: number): Vector {
  return { x: point.x + by.x * times, y: point.y + by.y * times, z: point.z + by.z * times };
}

/** Unit vector into the wood: along × across, because x right and y down leave z pointing away from the viewer. */
export function inward({ along, across }: Plane): Vector {
  return {
    x: along.y * across.z - along.z * across.y,
    y: along.z * across.x - along.x * across.z,
    z: along.x * across.y - along.y * across.x,
  };
}

/** The log-frame point of a face-frame point in mm. */
export function pointOn(plane: Plane, xMm: number, yMm: number): Vector {
  return offset(offset(plane.origin, plane.along, xMm), plane.across, yMm);
}

/** A parallel plane that lies deeper by `depthMm`, its corner straight below. */
export function deeper(plane: Plane, depthMm: number): Plane {
  return { ...plane, origin: offset(plane.origin, inward(plane), depthMm) };
}

/** The far side of a piece, as seen once it is turned over about its long axis: y runs the other way. */
export function turned(plane: Plane, thicknessMm: number, widthMm: number): Plane {
  const { x, y, z } = plane.across;
  return {
    origin: offset(deeper(plane, thicknessMm).origin, plane.across, widthMm),
    along: plane.along,
    across: { x: -x, y: -y, z: -z },
  };
}

// Pores and fibre are finer than a pixel; samples this close across the grain still find them.
const SAMPLE_PITCH_MM = 0.2;
const MOST_SAMPLES = 4;

/**
 * The face of a plane at a scale. Each pixel is the mean of samples on a diagonal through it, closer across the grain
 * than along it because wood changes faster that way.
 */
export function planeFace(log: Log, plane: Plane, size: FaceSize, pxPerMm: number): FacePicture {
  const width = Math.max(1, Math.round(size.lengthMm * pxPerMm));
  const height = Math.max(1, Math.round(size.widthMm * pxPerMm));
  const samples = Math.min(MOST_SAMPLES, Math.max(1, Math.ceil(1 / (pxPerMm * SAMPLE_PITCH_MM) - 0.01)));
  const rgb = new Uint8Array(width * height * 3);
  const place = emptyPlace();
  const color: MutableTone = { r: 0, g: 0, b: 0 };
  for (let i = 0; i < width; i++) {
    const near = branchesOfColumn(log, plane, i / pxPerMm, (i + 1) / pxPerMm, height / pxPerMm);
    for (let j = 0; j < height; j++) {
      let r = 0;
      let g = 0;
      let b = 0;
      for (let k = 0; k < samples; k++) {
        // Half a step in from the pixel's edge, so that one sample falls on its centre.
        const xMm = (i + (((k * 2 + 1) % samples) + 0.5) / samples) / pxPerMm;
        const yMm = (j + (k + 0.5) / samples) / pxPerMm;
        const x = plane.origin.x + plane.along.x * xMm + plane.across.x * yMm;
        const y = plane.origin.y + plane.along.y * xMm + plane.across.y * yMm;
        const z = plane.origin.z + plane.along.z * xMm + plane.across.z * yMm;
        readLog(log, x, y, z, near, place);
        woodColor(log, place, color);
        r += color.r;
        g += color.g;
        b += color.b;
      }
      const at = (j * width + i) * 3;
      rgb[at] = toByte(r / samples);
      rgb[at + 1] = toByte(g / samples);
      rgb[at + 2] = toByte(b / samples);
    }
  }
  return { rgb, width, height, pxPerMm };
}

function branchesOfColumn(log: Log, plane: Plane, fromMm: number, toMm: number, heightMm: number): number[] {
  const corners = [
    pointOn(plane, fromMm, 0).z,
    pointOn(plane, toMm, 0).z,
    pointOn(plane, fromMm, heightMm).z,
    pointOn(plane, toMm, heightMm).z,
  ];
  return branchesNear(log, Math.min(...corners), Math.max(...corners));
}

function toByte(value: number): number {
  return Math.max(0, Math.min(255, Math.round(value)));
}
