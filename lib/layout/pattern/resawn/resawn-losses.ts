/**
 * What resawing takes of the thickness, and what that does to the figure (engine: patterns on solid stock, resawn pair). With d the
 * kerf and the planing of the two sawn faces, and φ the lean of the figure's surfaces from the face's normal across the grain, the
 * figure jumps at the seam by
 *
 *   d · tan φ
 *
 * for a surface that leans lies that much farther across on the deeper of the two faces. Lengths in µm.
 */
import { type Um, um } from "../../units/um";
import type { ResawnFace } from "../face";

/** Wood that is gone between the two faces that show. */
export function thicknessLoss({ resaw }: ResawnFace): Um {
  return um(resaw.kerf + 2 * resaw.planing);
}

/** Of the stock: two leaves, the kerf, and planing on both faces of each. */
export function roughThickness({ leaf, resaw }: ResawnFace): Um {
  return um(2 * leaf.thickness + resaw.kerf + 4 * resaw.planing);
}

/** Across the grain; null while the lean is not known. */
export function jumpOfLean(face: ResawnFace): Um | null {
  return face.leanDeg === null ? null : um(Math.round(thicknessLoss(face) * tangent(face.leanDeg)));
}

/**
 * Where the photograph of the face has what each leaf shows: nearer the top edge by depth · tan φ. The leaf at the photographed face
 * (the second place) shows its back, the other what lay d below that.
 */
export function figureOffsets(face: ResawnFace): readonly [Um, Um] | readonly [null, null] {
  const jump = jumpOfLean(face);
  if (face.leanDeg === null || jump === null) return [null, null];
  const depth = face.resaw.planing + face.leaf.thickness;
  const nearer = um(Math.round(-depth * tangent(face.leanDeg)));
  return [um(nearer - jump), nearer];
}

function tangent(degrees: number): number {
  return Math.tan((degrees * Math.PI) / 180);
}
