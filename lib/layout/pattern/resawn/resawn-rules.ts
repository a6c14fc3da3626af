/** A resawn pair: two leaves from one rectangle of the board, the second mirrored, glued at the edge where the book opens. */
import { um } from "../../units/um";
import type { ResawnFace } from "../face";
import type { FaceFault } from "../face-fault";
import { cutBetween } from "../loss";
import type { ChartPlace, CutSettings, PatternRules } from "../pattern-rules";
import { seamBetween } from "../seam-between";
import { figureOffsets, roughThickness } from "./resawn-losses";

export const resawnRules: PatternRules<ResawnFace> = {
  count: () => 2,
  pieces: (face) => rectsOf(face).map((rect) => ({ role: "leaf", rect })),
  size: (face) => {
    const { width, height } = face.leaf;
    return face.opens === "side" ? { width: um(2 * width), height } : { width, height: um(2 * height) };
  },
  places: placesOfPair,
  cleanUps: cleanUpsOfPair,
  seams: (face) => {
    const [first, second] = rectsOf(face);
    return [seamBetween({ index: 0, rect: first }, { index: 1, rect: second }, face.opens === "side" ? "right" : "down")];
  },
  faults: resawnFaults,
  oneBlank: () => [[0, 1]],
  stockThickness: roughThickness,
  figureOffsets,
};

function rectsOf({ leaf, opens }: ResawnFace) {
  const { width, height } = leaf;
  const [x, y] = opens === "side" ? [width, um(0)] : [um(0), height];
  return [
    { x: um(0), y: um(0), width, height },
    { x, y, width, height },
  ] as const;
}

/** The anchor is found from the leaf that shows the wood as photographed: of the other, one point of the face is another of the wood. */
function placesOfPair({ face }: CutSettings<ResawnFace>): ChartPlace[] {
  const [rect] = rectsOf(face);
  return [
    { rect, mirrored: "no", anchors: true },
    { rect, mirrored: face.opens === "side" ? "leftRight" : "topBottom", anchors: false },
  ];
}

/** As of two neighbours in a row or a stack; the one blank takes the larger at each of its edges. */
function cleanUpsOfPair(layout: CutSettings<ResawnFace>) {
  const columnCut = layout[cutBetween("columns", layout.face.grain)];
  const rowCut = layout[cutBetween("rows", layout.face.grain)];
  const edges = {
    left: columnCut.cleanUpAfter,
    right: columnCut.cleanUpBefore,
    top: rowCut.cleanUpAfter,
    bottom: rowCut.cleanUpBefore,
  };
  return [edges, edges];
}

function resawnFaults({ leaf, resaw, leanDeg }: ResawnFace): FaceFault[] {
  const faults: FaceFault[] = [];
  for (const axis of ["width", "height", "thickness"] as const) {
    if (!(leaf[axis] > 0)) faults.push({ fault: "size-not-positive", axis, index: 0 });
  }
  if (!(resaw.kerf >= 0 && resaw.planing >= 0)) faults.push({ fault: "negative-length", where: "resaw" });
  if (leanDeg !== null && !(Math.abs(leanDeg) < 90)) faults.push({ fault: "lean-out-of-range" });
  return faults;
}
