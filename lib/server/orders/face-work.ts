/** What is done to the pieces of a face once they are cut, from the core's plans, as a cut order freezes it. */
import "server-only";
import { cutOutPlan, type FaceLayout, labelAt, pieceIdAt, piecesOfCutOut, resawnPlan, wrapPlan } from "@/lib/layout";
import type { FaceWork } from "@/lib/schemas/face-work";

/** null for a face whose pieces only need to be cut and cleaned up. */
export function faceWorkOf(layout: FaceLayout): FaceWork | null {
  return setBackOf(layout) ?? runOf(layout) ?? resawOf(layout);
}

function setBackOf(layout: FaceLayout): FaceWork | null {
  const { face } = layout;
  const plan = cutOutPlan(layout);
  if (plan === null || face.pattern !== "cutOut") return null;
  const shiftOf = new Map(plan.shifts.map(({ piece, shift }) => [piece, shift]));
  const openingOf = new Map(plan.openings.map(({ front, width, height }) => [front, { width, height }]));
  const finishedOf = new Map(plan.fronts.map(({ front, finished }) => [front, finished]));
  const pieces = piecesOfCutOut(face).map((piece, index) => ({ ...piece, id: pieceIdAt(index), label: labelAt(index) }));
  return {
    pattern: "cutOut",
    grain: face.grain,
    outside: plan.outside,
    rails: face.rails,
    strips: pieces.filter(({ role }) => role === "strip").map(({ id, label }) => ({ label, shift: shiftOf.get(id) ?? null })),
    rows: face.rows.map((_, row) => {
      const inRow = pieces.filter((piece) => piece.role !== "strip" && piece.row === row);
      return {
        fixed: inRow.filter(({ role }) => role === "fixed").map(({ id, label }) => ({ label, shift: shiftOf.get(id) ?? null })),
        fronts: inRow.flatMap(({ id, role, label }) => {
          const [opening, finished] = [openingOf.get(id), finishedOf.get(id)];
          return role === "front" && opening && finished ? [{ label, opening, finished }] : [];
        }),
      };
    }),
  };
}

function runOf(layout: FaceLayout): FaceWork | null {
  const { face } = layout;
  const plan = wrapPlan(layout);
  if (plan === null || face.pattern !== "wrap") return null;
  const label = (piece: string) => piece.slice(1);
  return {
    pattern: "wrap",
    thickness: face.thickness,
    corners: plan.corners.map(({ before, after, corner, bevelDeg, parted, hungGap }) => ({
      before: label(before),
      after: label(after),
      kind: corner.kind,
      bevelDeg,
      way: parted?.way ?? null,
      gap: hungGap,
    })),
    sides: plan.sides.map(({ piece, show, inner }) => ({ label: label(piece), show, inner })),
  };
}

function resawOf(layout: FaceLayout): FaceWork | null {
  const { face } = layout;
  const plan = resawnPlan(layout);
  if (plan === null || face.pattern !== "resawn") return null;
  return {
    pattern: "resawn",
    labels: [labelAt(0), labelAt(1)],
    opens: face.opens,
    roughThickness: plan.roughThickness,
    leafThickness: face.leaf.thickness,
    kerf: face.resaw.kerf,
    planing: face.resaw.planing,
  };
}
