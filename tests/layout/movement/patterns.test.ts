/** Movement in patterns that are no grid: fronts cut from a rail, and runs round corners. */
import { describe, expect, test } from "vitest";
import {
  type CutOutFace,
  faceMovement,
  freshLayout,
  letLoose,
  placeGroup,
  SET_ID,
  um,
  umFromMm,
  type WrapCorner,
  type WrapFace,
  withRecommendedGap,
} from "@/lib/layout";
import { accepted } from "../arbitrary-layout";
import { cherry, cherryFace } from "./moving-face";

const saw = { kerf: umFromMm(3), cleanUpBefore: um(0), cleanUpAfter: um(0) };
const cuts = { crosscut: saw, rip: saw, spacing: "tight" as const };
const mm = umFromMm;

/** A rail of three strips' height with one front of 400 × 117 mm in an opening of 403 × 120, gap 1.5 mm all round. */
const rail: CutOutFace = {
  pattern: "cutOut",
  grain: "horizontal",
  strips: [mm(40), mm(40)],
  rows: [
    {
      height: mm(120),
      parts: [
        { kind: "fixed", width: mm(60) },
        { kind: "front", width: mm(403) },
        { kind: "fixed", width: mm(60) },
      ],
    },
  ],
  gap: { left: mm(1.5), right: mm(1.5), top: mm(1.5), bottom: mm(1.5) },
  fitting: um(0),
  rails: "fromSaw",
};

const laidRail = () => accepted(placeGroup(freshLayout(rail, cuts), SET_ID, "b1", { x: um(0), y: um(0) }, 0));

describe("a front cut from a rail of flat-sawn cherry at 8 %, in a place of 6 to 12 %", () => {
  test("keeps its gaps: rail and front move as one, along the grain neither", () => {
    const { gaps } = faceMovement(cherryFace(laidRail()));
    expect(gaps.map(({ runs, rail: part, figures }) => [runs, part, figures?.driest, figures?.dampest])).toEqual([
      ["upright", "p1", 1_493, 1_515],
      ["sideways", "p2", 1_500, 1_500],
      ["sideways", "p4", 1_500, 1_500],
      ["upright", "p5", 1_493, 1_515],
    ]);
  });

  test("has the glued joints of the rail for no gaps, and takes no account of what stands round it", () => {
    const alone = faceMovement(cherryFace(laidRail()));
    const cased = faceMovement(cherryFace(laidRail(), { surround: { kind: "sameWood", grain: "across", moisture: 12 } }));
    expect(cased.gaps).toEqual(alone.gaps);
  });

  test("closes when the front comes from a drier board: half the front's height swells into each gap", () => {
    const loose = accepted(letLoose(laidRail(), "p3"));
    const id = loose.groups.at(-1)?.id ?? "";
    const layout = accepted(placeGroup(loose, id, "b2", { x: um(0), y: um(0) }, 0));
    const wood = { movement: cherry, ringAngle: 0 };
    const woods = new Map([
      ["b1", { ...wood, moisture: 10 }],
      ["b2", { ...wood, moisture: 6 }],
    ]);
    const [above] = faceMovement(cherryFace(layout, { woods })).gaps;
    // To 12 %: rail +2 % over 60 mm, front +6 % over 58.5 mm, at 0.00248 a percent.
    expect(above?.figures?.dampest).toBe(Math.round(60_000 * (1 + 0.00496) - 58_500 * (1 + 0.01488)));
  });

  test("is trimmed to the recommended gap in the opening it has", () => {
    const outcome = withRecommendedGap(cherryFace(laidRail(), { leastGap: mm(2) }), "upright", { um: 100, parts: 1 });
    if (!outcome.ok) throw new Error(outcome.reason);
    expect(outcome.layout.face).toEqual({ ...rail, gap: { ...rail.gap, top: 2_100, bottom: 2_100 } });
    expect(outcome.mostGivenUp).toBe(1_200);
  });
});

describe("a run round corners", () => {
  const corner = (kind: WrapCorner["kind"]): WrapCorner =>
    kind === "gap"
      ? { kind, turnDeg: 90, gap: mm(2) }
      : kind === "butt"
        ? { kind, turnDeg: 90, covers: "before" }
        : { kind, turnDeg: 90, parting: "oneBevel" };
  const run = (kinds: readonly WrapCorner["kind"][], grain: WrapFace["grain"]) => {
    const face: WrapFace = {
      pattern: "wrap",
      grain,
      sides: Array.from({ length: kinds.length + 1 }, () => mm(200)),
      height: mm(300),
      thickness: mm(20),
      corners: kinds.map(corner),
      closed: false,
    };
    const layout = freshLayout(face, cuts);
    return accepted(placeGroup(layout, SET_ID, "b1", { x: um(0), y: um(0) }, grain === "horizontal" ? 0 : 1));
  };

  test("has gaps where its corners are gaps: butts and mitres are joints", () => {
    const { gaps } = faceMovement(cherryFace(run(["gap", "butt", "mitre", "gap"], "horizontal")));
    expect(gaps.map(({ a, b }) => [a, b])).toEqual([
      ["p1", { piece: "p2" }],
      ["p4", { piece: "p5" }],
    ]);
  });

  test("is still where its grain runs round with it, and moves as fronts do where the grain stands upright", () => {
    expect(faceMovement(cherryFace(run(["gap"], "horizontal"))).gaps[0]?.figures).toMatchObject({
      driest: 2_000,
      dampest: 2_000,
    });
    expect(faceMovement(cherryFace(run(["gap"], "vertical"))).gaps[0]?.figures).toMatchObject({ driest: 2_992, dampest: 16 });
  });

  test("offers no even gaps: its corners are made by hand", () => {
    for (const runs of ["sideways", "upright"] as const) {
      const outcome = withRecommendedGap(cherryFace(run(["gap"], "vertical")), runs, { um: 100, parts: 1 });
      expect(outcome).toEqual({ ok: false, reason: "no-gaps" });
    }
  });
});
