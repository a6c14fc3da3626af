/** Gaps of a face through the year. */
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type BoardWood,
  changeFace,
  type FaceGap,
  type FaceLayout,
  type FaceMovement,
  faceMovement,
  freshLayout,
  type MovementRequest,
  placeGroup,
  SET_ID,
  type Surround,
  stackFace,
  strainAcross,
  type Um,
  um,
  umFromMm,
} from "@/lib/layout";
import { accepted, arbitrarySet, umBetween } from "../arbitrary-layout";
import { arbitraryRequest, cherry, cherryFace } from "./moving-face";

const saw = { kerf: umFromMm(3), cleanUpBefore: um(0), cleanUpAfter: um(0) };
const cuts = { crosscut: saw, rip: saw, spacing: "followGap" as const };

/** Three fronts of 200 mm one above the other, grain along them, gaps of 3 mm. */
function stackOfThree() {
  const face = stackFace([200, 200, 200].map(umFromMm), umFromMm(600), umFromMm(3), "horizontal");
  return accepted(placeGroup(freshLayout(face, cuts), SET_ID, "b1", { x: um(0), y: um(0) }, 0));
}

const widths = ({ gaps }: FaceMovement) => gaps.map(({ figures }) => figures);
const kinds = ({ warnings }: FaceMovement) => warnings.map(({ kind }) => kind);
const figuresWith = (surround: Surround, change: Partial<MovementRequest> = {}) =>
  widths(faceMovement(cherryFace(stackOfThree(), { surround, ...change })));

describe("a stack of cherry fronts of 200 mm, cut with gaps of 3 mm at 8 %, in a place of 6 to 12 %", () => {
  // 200 mm · 0.00248 per percent = 0.496 mm a percent: −0.992 mm at 6 %, +1.984 mm at 12 %.
  const still = { driest: 3_992, dampest: 1_016, toCut: 3_484 };

  test("loses to the fronts what a case of plywood, of solid parts or none does not give", () => {
    for (const surround of [
      { kind: "sheet" },
      { kind: "none" },
      { kind: "sameWood", grain: "lengthwise", moisture: null },
      { kind: "sameWood", grain: "across", moisture: null },
    ] as const) {
      expect(figuresWith(surround)).toEqual([still, still]);
    }
  });

  test("keeps its gaps in a panel of the same wood and direction, but for the movement over the gap itself", () => {
    const figures = { driest: 2_985, dampest: 3_030, toCut: 1_508 };
    expect(figuresWith({ kind: "sameWood", grain: "with", moisture: null })).toEqual([figures, figures]);
  });

  test("closes by what a panel at another moisture does not go along with", () => {
    // The panel was at 11 %: dampest +1 % of 203 mm, the fronts +4 % of 200 mm.
    const [figures] = figuresWith({ kind: "sameWood", grain: "with", moisture: 11 });
    expect(figures?.dampest).toBe(Math.round(3_000 + 203_000 * 0.00248 - 200_000 * 0.00992));
  });

  test("moves half as much at the outer gaps, which have a front on one side only", () => {
    const { gaps } = faceMovement(cherryFace(stackOfThree(), { surround: { kind: "sheet" }, around: umFromMm(2) }));
    const at = (side: string) => gaps.filter(({ b }) => "side" in b && b.side === side);
    expect(at("top")).toHaveLength(1);
    expect(at("left")).toHaveLength(3);
    expect(at("top")[0]?.figures).toEqual({ driest: 2_496, dampest: 1_008, toCut: 2_492 });
    // Along the grain wood is still.
    expect(at("left")[0]).toMatchObject({ across: 0, figures: { driest: 2_000, dampest: 2_000, toCut: 1_500 } });
  });

  test("with vertical grain does not move upright", () => {
    const face = stackFace([200, 200].map(umFromMm), umFromMm(600), umFromMm(3), "vertical");
    const layout = accepted(placeGroup(freshLayout(face, cuts), SET_ID, "b1", { x: um(0), y: um(0) }, 1));
    expect(widths(faceMovement(cherryFace(layout)))).toEqual([{ driest: 3_000, dampest: 3_000, toCut: 1_500 }]);
  });
});

describe("warnings", () => {
  const movement = (change: Partial<MovementRequest>) => faceMovement(cherryFace(stackOfThree(), change));

  test("none where everything is known and every gap stays wide enough", () => {
    expect(kinds(movement({ leastGap: um(500) }))).toEqual([]);
  });

  test("a gap that comes to nothing closes, one below the least gap is too narrow, each with its season", () => {
    expect(movement({}).warnings).toMatchObject([{ kind: "too-narrow", season: "dampest", least: 1_016 }]);
    const wet = movement({ year: { driest: 6, dampest: 15 } }).warnings;
    expect(wet).toMatchObject([
      { kind: "range-left", moistures: [15] },
      { kind: "closes", season: "dampest", least: -472 },
    ]);
    expect(wet[1]).toHaveProperty("gaps.length", 2);
  });

  test("no species, no reading, wood above fibre saturation: said, and no figure is made up", () => {
    const wood = { movement: cherry, ringAngle: 0, moisture: 8 };
    const figuresAnd = (change: object) => {
      const told = movement({ woods: new Map([["b1", { ...wood, ...change }]]) });
      return [...kinds(told), ...widths(told)];
    };
    expect(figuresAnd({ movement: null })).toEqual(["no-species", null, null]);
    expect(figuresAnd({ moisture: null })).toEqual(["no-reading", null, null]);
    expect(figuresAnd({ moisture: 34 })).toEqual(["too-damp", null, null]);
    expect(movement({ woods: new Map() }).warnings).toMatchObject([{ kind: "no-species" }, { kind: "no-reading" }]);
  });

  test("wood drier or damper than its place will make it", () => {
    expect(movement({ leastGap: um(0), year: { driest: 9, dampest: 12 } }).warnings).toMatchObject([
      { kind: "outside-place", moisture: 8 },
    ]);
  });

  test("board and surround that differ by more than the limit, not by the limit itself", () => {
    const differing = (moisture: number) =>
      movement({ leastGap: um(0), surround: { kind: "sameWood", grain: "with", moisture } }).warnings;
    expect(differing(10)).toEqual([]);
    expect(differing(10.1)).toMatchObject([{ kind: "surround-differs", moisture: 8, surround: 10.1 }]);
  });

  test("fronts that are not laid on wood", () => {
    const face = stackFace([200, 200].map(umFromMm), umFromMm(600), umFromMm(3), "horizontal");
    const told = faceMovement(cherryFace(freshLayout(face, cuts)));
    expect(told.warnings).toEqual([{ kind: "not-on-wood", pieces: ["p1", "p2"] }]);
    expect(widths(told)).toEqual([null]);
  });
});

describe("of any face", () => {
  test("a gap cut as recommended is at least the least gap at both ends of the year, and one narrower is not", () => {
    fc.assert(
      fc.property(
        arbitraryRequest.filter(({ layout }) => layout.face.pattern === "grid"),
        (request) => {
          const [gap] = faceMovement(request).gaps.filter(({ figures }) => figures !== null);
          if (!gap?.figures) return;
          const { toCut } = gap.figures;
          // A gap of nothing is none: no front can be nearer.
          if (toCut > 0) expect(leastOf(request, gap, toCut)).toBeGreaterThanOrEqual(request.leastGap);
          if (toCut > 3) expect(leastOf(request, gap, toCut - 3)).toBeLessThan(request.leastGap);
        },
      ),
      { numRuns: 40 },
    );
  });

  test("swells towards its gaps: where nothing round them moves none is wider at the dampest than at the driest", () => {
    fc.assert(
      fc.property(arbitraryRequest, (request) => {
        for (const { figures, rail } of faceMovement({ ...request, surround: { kind: "sheet" } }).gaps) {
          if (figures !== null && rail === null) expect(figures.dampest).toBeLessThanOrEqual(figures.driest);
        }
      }),
      { numRuns: 40 },
    );
  });

  test("in a surround of its own wood, moisture and direction keeps every gap to the movement over the gap itself", () => {
    fc.assert(
      // Not among loose pieces, which may lie across the others' grain.
      fc.property(arbitraryRequest, arbitrarySet, (request, layout) => {
        const wood = request.woods.get("b1");
        if (wood === undefined) throw new Error("no wood");
        const surround = { kind: "sameWood", grain: "with", moisture: null } as const;
        for (const { figures, gap, across } of faceMovement({ ...request, layout, surround }).gaps) {
          if (figures === null) continue;
          for (const season of ["driest", "dampest"] as const) {
            const strain = strainOf(wood, request.year[season]) * across;
            expect(Math.abs(figures[season] - gap * (1 + strain))).toBeLessThanOrEqual(0.5 + 1e-9);
          }
        }
      }),
      { numRuns: 40 },
    );
  });

  test("at the moisture it was cut at, with a surround of the same, every gap is as it was cut", () => {
    fc.assert(
      fc.property(arbitraryRequest, fc.double({ min: 6, max: 12, noNaN: true }), (request, moisture) => {
        const woods = new Map([...request.woods].map(([board, wood]) => [board, { ...wood, moisture }]));
        const surround = request.surround.kind === "sameWood" ? { ...request.surround, moisture: null } : request.surround;
        const year = { driest: moisture, dampest: moisture };
        for (const { figures, gap } of faceMovement({ ...request, woods, surround, year }).gaps) {
          if (figures !== null) expect([figures.driest, figures.dampest]).toEqual([gap, gap]);
        }
      }),
      { numRuns: 40 },
    );
  });

  test("the same turned end for end on its board moves the same", () => {
    fc.assert(
      fc.property(umBetween(0, 5_000), fc.boolean(), (gap, upright) => {
        const face = stackFace([180, 200].map(umFromMm), umFromMm(600), gap, upright ? "vertical" : "horizontal");
        const laid = (turns: 0 | 1 | 2 | 3) =>
          widths(
            faceMovement(cherryFace(accepted(placeGroup(freshLayout(face, cuts), SET_ID, "b1", { x: um(0), y: um(0) }, turns)))),
          );
        expect(upright ? laid(1) : laid(0)).toEqual(upright ? laid(3) : laid(2));
      }),
      { numRuns: 40 },
    );
  });
});

function strainOf({ movement, ringAngle, moisture }: BoardWood, to: number): number {
  if (movement === null || moisture === null) throw new Error("no wood");
  return strainAcross(movement, ringAngle, moisture, to) ?? Number.NaN;
}

/** The narrowest that one gap becomes over the year when the face is made anew with it cut so wide. */
function leastOf(request: MovementRequest, gap: FaceGap, cut: number): number {
  const recut = "side" in gap.b ? { ...request, around: um(cut) } : { ...request, layout: withGap(request.layout, gap, um(cut)) };
  const found = faceMovement(recut).gaps.find(({ a, b }) => a === gap.a && JSON.stringify(b) === JSON.stringify(gap.b));
  if (!found?.figures) throw new Error("no such gap");
  return Math.min(found.figures.driest, found.figures.dampest);
}

function withGap(layout: FaceLayout, { a, runs }: FaceGap, cut: Um): FaceLayout {
  const { face } = layout;
  if (face.pattern !== "grid") throw new Error("not a grid");
  const index = Number(a.slice(1)) - 1;
  const change =
    runs === "sideways"
      ? { columnGaps: face.columnGaps.with(index % face.columns.length, cut) }
      : { rowGaps: face.rowGaps.with(Math.floor(index / face.columns.length), cut) };
  return changeFace(layout, { ...face, ...change }).layout;
}
