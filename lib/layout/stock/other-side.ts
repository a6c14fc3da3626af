/**
 * The two faces of one board. The back's stock frame is the face's, turned over about the long edge: left stays left, and what was the
 * upper edge is the lower one.
 *
 *   x_back = x_face      y_back = width − y_face
 */
import type { Isometry } from "../frame/isometry";
import { type Um, um } from "../units/um";
import type { KeepClearShape } from "./board";
import { liesOnBoard } from "./carry-zones";
import { movedArea } from "./move-area";
import type { BoardSize } from "./polygon-fault";

/** From the frame of one side to that of the other, either way; `width`: of the board on the side one comes out on. */
export function otherSideFrom(width: Um): Isometry {
  return { a: 1, b: 0, c: 0, d: -1, tx: 0, ty: width };
}

/** Areas of one side as they lie on the other, and how many of them do not reach onto it at all. */
export function turnedOver<Area extends { readonly area: KeepClearShape }>(
  areas: readonly Area[],
  onto: BoardSize,
): { readonly areas: Area[]; readonly off: number } {
  const map = otherSideFrom(onto.width);
  const moved = areas.map((area) => ({ ...area, area: movedArea(map, area.area) })).filter(({ area }) => liesOnBoard(area, onto));
  return { areas: moved, off: areas.length - moved.length };
}

/** Two pictures of one board are thought to agree within so much: common practice, no source. */
export const SIDES_AGREE = { atLeast: um(2000), share: 0.003 } as const;

export interface SidesCheck {
  readonly agree: boolean;
  /** The back less the face. */
  readonly lengthBy: Um;
  readonly widthBy: Um;
}

/** Whether face and back came out at one size, each measured by itself: within 2 mm or 0.3 % of the size, whichever is more. */
export function sidesCheck(face: BoardSize, back: BoardSize): SidesCheck {
  const within = (by: number, of: Um) => Math.abs(by) <= Math.max(SIDES_AGREE.atLeast, of * SIDES_AGREE.share);
  const [lengthBy, widthBy] = [um(back.length - face.length), um(back.width - face.width)];
  return { agree: within(lengthBy, face.length) && within(widthBy, face.width), lengthBy, widthBy };
}
