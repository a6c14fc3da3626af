/** Which clean-up each edge of a piece gets, seen in the stock frame: the sawn blank is the piece grown by these. */
import type { Edge } from "../program/program";
import type { Um } from "../units/um";
import type { FaceLayout, QuarterTurns } from "./face-layout";
import { cutBetween } from "./loss";

/** Clockwise as seen, so that n quarter turns take an edge n places on. */
const clockwise = ["top", "right", "bottom", "left"] as const satisfies readonly Edge[];

/**
 * Clean-up per stock edge of a piece laid with these turns. On the face the edge before a cut is a piece's right or bottom
 * one, the edge after it the next piece's left or top one; outer edges of the face are sawn and cleaned like the rest.
 */
export function cleanUpEdges(layout: FaceLayout, turns: QuarterTurns): Readonly<Record<Edge, Um>> {
  const columnCut = layout[cutBetween("columns", layout.face.grain)];
  const rowCut = layout[cutBetween("rows", layout.face.grain)];
  const onFace: Readonly<Record<Edge, Um>> = {
    left: columnCut.cleanUpAfter,
    right: columnCut.cleanUpBefore,
    top: rowCut.cleanUpAfter,
    bottom: rowCut.cleanUpBefore,
  };
  const lyingAt = (edge: Edge) => onFace[clockwise[(clockwise.indexOf(edge) + 4 - turns) % 4] ?? edge];
  return { left: lyingAt("left"), right: lyingAt("right"), top: lyingAt("top"), bottom: lyingAt("bottom") };
}
