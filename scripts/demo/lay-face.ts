/** Lays a face of the demo on its board, with the core's own tools as a maker would at the layout table. Pure. */
import {
  type BoardFace,
  type FaceLayout,
  groupOf,
  kerfsOf,
  type LayoutChange,
  leastSlide,
  letLoose,
  lyingPieces,
  moveGroup,
  placeGroup,
  problems,
  SET_ID,
  turnsAlongGrain,
  um,
  umFromMm,
} from "@/lib/layout";
import type { DemoFace, DemoPlace } from "./jobs";

/** The layout with every piece on the board. Throws where the scenario asks for what cannot be, or leaves trouble it does not mean to. */
export function layFace(fresh: FaceLayout, demo: DemoFace, board: BoardFace): FaceLayout {
  const { loose, place, leftInTrouble = false } = demo;
  let layout = fresh;
  if (loose) layout = done(letLoose(layout, loose.piece));
  layout = layGroup(layout, SET_ID, place, board, leftInTrouble);
  if (loose) layout = layGroup(layout, groupOf(layout, loose.piece)?.id ?? "", loose, board, leftInTrouble);

  const found = problems(layout, [board]);
  if (found.length > 0 !== leftInTrouble) {
    throw new Error(`“${demo.title}” is ${leftInTrouble ? "not " : ""}in trouble: ${JSON.stringify(found)}`);
  }
  return layout;
}

/** Slides a group that lies on wood. */
export function slide(layout: FaceLayout, groupId: string, by: Parameters<typeof moveGroup>[2]): FaceLayout {
  return done(moveGroup(layout, groupId, by));
}

/** At the place asked for, and from there by the least slide that is clear of everything, unless trouble is wanted. */
function layGroup(
  layout: FaceLayout,
  groupId: string,
  { xMm, yMm }: Omit<DemoPlace, "board">,
  board: BoardFace,
  leftInTrouble: boolean,
): FaceLayout {
  const [turns] = turnsAlongGrain(layout.face.grain);
  const laid = done(placeGroup(layout, groupId, board.id, { x: umFromMm(xMm), y: umFromMm(yMm) }, turns));
  if (leftInTrouble) return laid;
  const pieces = lyingPieces(laid);
  const group = pieces.filter((piece) => piece.groupId === groupId);
  const others = pieces.filter((piece) => piece.groupId !== groupId);
  const along = leastSlide(group, { board, others, kerfs: kerfsOf(laid) });
  if (along === null) throw new Error(`no slide along the board clears ${groupId} at ${xMm}, ${yMm} mm`);
  return slide(laid, groupId, { x: along, y: um(0) });
}

function done(change: LayoutChange): FaceLayout {
  if (!change.ok) throw new Error(`a layout of the demo cannot be changed so: ${JSON.stringify(change.refusal)}`);
  return change.layout;
}
