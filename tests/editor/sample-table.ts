/** A small table to test on: a row of four fronts, two boards, one with a knot. */
import type { TableDocument } from "@/lib/editor/document";
import type { TableBoard } from "@/lib/editor/table-board";
import { type BoardFace, freshLayout, placeGroup, rowFace, SET_ID, um, umFromMm } from "@/lib/layout";

export const longBoard: BoardFace = {
  id: "0190a0a0-0000-7000-8000-00000000000a",
  length: umFromMm(2400),
  width: umFromMm(220),
  thickness: umFromMm(25),
  outline: null,
  keepClear: [
    {
      id: "0190a0a0-0000-7000-8000-0000000000aa",
      kind: "knot",
      area: {
        shape: "ellipse",
        centre: { x: umFromMm(1700), y: umFromMm(110) },
        radiusX: umFromMm(30),
        radiusY: umFromMm(20),
        turnDeg: 10,
      },
    },
  ],
  spokenFor: [],
  glueLines: [],
};

export const shortBoard: BoardFace = {
  id: "0190a0a0-0000-7000-8000-00000000000b",
  length: umFromMm(1300),
  width: umFromMm(260),
  thickness: umFromMm(25),
  outline: null,
  keepClear: [],
  spokenFor: [],
  glueLines: [],
};

export const boards = [longBoard, shortBoard] as const;

const saw = { kerf: umFromMm(2.4), cleanUpBefore: umFromMm(0.2), cleanUpAfter: umFromMm(0.2) };

/** Fronts of 240 mm, 150 mm high, 3 mm gaps; the set lies on the long board from 100 mm on. */
export function rowDocument(): TableDocument {
  const face = rowFace([240, 240, 240, 240].map(umFromMm), umFromMm(150), umFromMm(3), "horizontal");
  const fresh = freshLayout(face, { crosscut: saw, rip: saw, spacing: "followGap" });
  const placed = placeGroup(fresh, SET_ID, longBoard.id, { x: umFromMm(100), y: umFromMm(30) }, 0);
  if (!placed.ok) throw new Error("the sample does not place");
  return { layout: placed.layout, crosscutSawId: null, ripSawId: null };
}

/** The same fronts, not on wood yet. */
export function unplacedDocument(): TableDocument {
  const { layout, ...saws } = rowDocument();
  return { ...saws, layout: { ...layout, groups: layout.groups.map((group) => ({ ...group, placement: null })) } };
}

export function tableBoardOf(face: BoardFace): TableBoard {
  return {
    face,
    tag: "B-001",
    species: "ash",
    place: "",
    straighteningId: face.id,
    version: 1,
    side: "face",
    newerStraighteningId: null,
    otherSideStraighteningId: null,
    heldBy: [],
    spokenFor: [],
    inBlank: null,
    takenBy: null,
    levels: [],
  };
}

export const right = (mm: number) => ({ x: umFromMm(mm), y: um(0) });
