import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  changeAnchor,
  cutBetween,
  drifts,
  type FaceLayout,
  freshLayout,
  inverted,
  jumpAcrossGap,
  layOut,
  letLoose,
  lossOf,
  moveGroup,
  pieceIdsOf,
  placeGroup,
  rowFace,
  type Seam,
  seams,
  sliverOf,
  spacingOf,
  toStock,
  turnGroup,
  um,
} from "@/lib/layout";
import {
  accepted,
  arbitraryCut,
  arbitraryGridFace,
  arbitraryLayout,
  arbitraryLayoutOf,
  arbitraryOuterFace,
  arbitrarySet,
  arbitrarySetOf,
  arbitrarySpacing,
  umBetween,
} from "../arbitrary-layout";

const cut = { kerf: um(3_000), cleanUpBefore: um(100), cleanUpAfter: um(200) };

function tightRow(turns: 0 | 2): FaceLayout {
  const face = rowFace([um(200_000), um(100_000), um(150_000)], um(150_000), um(2_000), "horizontal");
  return accepted(
    placeGroup(freshLayout(face, { crosscut: cut, rip: cut, spacing: "tight" }), "set", "b1", { x: um(0), y: um(0) }, turns),
  );
}

/** The jump of a seam as seen on the face, taken back from the wood by the turn of the first piece. */
function onFace(layout: FaceLayout, { a, jump }: Seam) {
  const map = layOut(layout).find(({ id }) => id === a)?.stockFromFace;
  if (map === undefined || jump === null) throw new Error("no jump");
  const back = inverted({ ...map, tx: 0, ty: 0 });
  const { x, y } = toStock(back, { x: jump.along.min, y: jump.across.min });
  return { x, y };
}

describe("what a cut costs", () => {
  test("loss, spacing, jump and sliver hang together for any cut and gap", () => {
    fc.assert(
      fc.property(arbitraryCut, umBetween(0, 8_000), arbitrarySpacing, (one, gap, spacing) => {
        const loss = lossOf(one);
        expect(loss).toBe(one.kerf + one.cleanUpBefore + one.cleanUpAfter);
        expect(spacingOf(one, gap, spacing)).toBe(loss + sliverOf(one, gap, spacing));
        expect(spacingOf(one, gap, spacing)).toBe(gap + jumpAcrossGap(one, gap, spacing));
        if (spacing === "followGap") expect(jumpAcrossGap(one, gap, spacing)).toBe(Math.max(0, loss - gap));
        else expect(jumpAcrossGap(one, gap, spacing)).toBe(loss - gap);
      }),
    );
  });

  test.each([
    ["columns", "horizontal", "crosscut"],
    ["rows", "horizontal", "rip"],
    ["columns", "vertical", "rip"],
    ["rows", "vertical", "crosscut"],
  ] as const)("%s with %s grain are parted by a %s", (parted, grain, direction) => {
    expect(cutBetween(parted, grain)).toBe(direction);
  });
});

describe("seams", () => {
  test("the jump from the maps is the closed form, along the normal of the seam and nothing beside it, for every undisturbed grid", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryGridFace), (layout) => {
        for (const seam of seams(layout)) {
          const across = seam.normal === "right" ? "columns" : "rows";
          const jump = jumpAcrossGap(layout[cutBetween(across, layout.face.grain)], seam.gap, layout.spacing);
          expect(onFace(layout, seam)).toEqual(seam.normal === "right" ? { x: jump, y: 0 } : { x: 0, y: jump });
          expect(seam.jump?.along.max).toBe(seam.jump?.along.min);
          expect(seam.jump?.across.max).toBe(seam.jump?.across.min);
        }
      }),
    );
  });

  test("there is one seam for every pair of neighbours of a grid, in reading order", () => {
    fc.assert(
      fc.property(arbitraryLayoutOf(arbitraryGridFace), (layout) => {
        const rows = layout.face.rows.length;
        const columns = layout.face.columns.length;
        const found = seams(layout);
        expect(found).toHaveLength(rows * (columns - 1) + columns * (rows - 1));
        const order = found.map(({ a, b }) => Number(a.slice(1)) * 1_000 + Number(b.slice(1)));
        expect(order).toEqual([...order].sort((p, q) => p - q));
      }),
    );
  });

  test("a set turned end for end has the same jumps, turned", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryOuterFace), (layout) => {
        const turned = seams(accepted(turnGroup(layout, "set")));
        seams(layout).forEach(({ jump }, index) => {
          const other = turned[index]?.jump;
          expect(other?.along.min).toBe(-(jump?.along.max ?? Number.NaN) + 0);
          expect(other?.across.min).toBe(-(jump?.across.max ?? Number.NaN) + 0);
        });
      }),
    );
  });

  test("no jump between different boards, nor while a piece is not laid on wood", () => {
    const loose = accepted(letLoose(tightRow(0), "p2"));
    const elsewhere = accepted(placeGroup(loose, "loose-1", "b2", { x: um(0), y: um(0) }, 0));
    expect(seams(elsewhere).map(({ jump }) => jump)).toEqual([null, null]);
    const face = rowFace([um(200_000), um(100_000)], um(150_000), um(2_000), "horizontal");
    expect(seams(freshLayout(face, { crosscut: cut, rip: cut, spacing: "tight" })).map(({ jump }) => jump)).toEqual([null]);
  });

  test("a loose piece slid by a vector adds it to the jump on one side and takes it off on the other", () => {
    const loose = accepted(letLoose(tightRow(0), "p2"));
    const slid = accepted(moveGroup(loose, "loose-1", { x: um(5_000), y: um(-700) }));
    expect(seams(slid).map(({ jump }) => jump)).toEqual([
      { along: { min: 6_300, max: 6_300 }, across: { min: -700, max: -700 } },
      { along: { min: -3_700, max: -3_700 }, across: { min: 700, max: 700 } },
    ]);
  });

  test("a neighbour turned end for end makes the jump run over a range, twice the height of the seam wide across the grain", () => {
    const loose = accepted(letLoose(tightRow(0), "p2"));
    const [first] = seams(accepted(turnGroup(loose, "loose-1")));
    const across = first?.jump?.across;
    expect((across?.max ?? 0) - (across?.min ?? 0)).toBe(300_000);
  });

  test("J(p) = M_B(q) − M_A(p) − L_A(g·n) at every point of the seam lies in the reported range", () => {
    fc.assert(
      fc.property(arbitraryLayoutOf(arbitraryOuterFace), fc.double({ min: 0, max: 1, noNaN: true }), (layout, share) => {
        const byId = new Map(layOut(layout).map((piece) => [piece.id, piece]));
        for (const { a, b, from, to, facing, gap, normal, jump } of seams(layout)) {
          const mapA = byId.get(a)?.stockFromFace;
          const mapB = byId.get(b)?.stockFromFace;
          if (jump === null || mapA === undefined || mapB === undefined) continue;
          const p = { x: um(Math.round(from.x + share * (to.x - from.x))), y: um(Math.round(from.y + share * (to.y - from.y))) };
          const [gx, gy] = normal === "right" ? [gap, 0] : [0, gap];
          const onA = toStock(mapA, p);
          const onB = toStock(mapB, { x: um(p.x + facing.x - from.x), y: um(p.y + facing.y - from.y) });
          const along = onB.x - onA.x - (mapA.a * gx + mapA.c * gy);
          const across = onB.y - onA.y - (mapA.b * gx + mapA.d * gy);
          expect(along).toBeGreaterThanOrEqual(jump.along.min);
          expect(along).toBeLessThanOrEqual(jump.along.max);
          expect(across).toBeGreaterThanOrEqual(jump.across.min);
          expect(across).toBeLessThanOrEqual(jump.across.max);
        }
      }),
    );
  });
});

describe("drifts", () => {
  const along = (layout: FaceLayout) => drifts(layout).map(({ drift }) => drift?.along);

  test("jumps of 1.3 mm add up from a left anchor, run the other way from a right one, and are shared out from a piece", () => {
    const row = tightRow(0);
    expect(along(accepted(changeAnchor(row, "left", "top")))).toEqual([0, 1_300, 2_600]);
    expect(along(accepted(changeAnchor(row, "right", "top")))).toEqual([-2_600, -1_300, 0]);
    expect(along(accepted(changeAnchor(row, { piece: "p2" }, "top")))).toEqual([-1_300, 0, 1_300]);
  });

  test("the centre anchor halves the largest drift, to half a micrometre, where no jump takes another back", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryGridFace), (layout) => {
        // Tight spacing can make jumps of both signs along one run.
        fc.pre(layout.spacing === "followGap");
        const largest = (one: FaceLayout) =>
          Math.max(
            ...drifts(one).map(({ drift }) =>
              Math.max(Math.abs(drift?.along ?? Number.NaN), Math.abs(drift?.across ?? Number.NaN)),
            ),
          );
        const fromCorner = largest(accepted(changeAnchor(layout, "left", "top")));
        const fromCentre = largest(accepted(changeAnchor(layout, "centre", "centre")));
        expect(Math.abs(fromCentre - fromCorner / 2)).toBeLessThanOrEqual(0.5);
      }),
    );
  });

  test("the difference of drift between neighbours is the jump of their seam", () => {
    fc.assert(
      fc.property(arbitraryLayout, (layout) => {
        const byId = new Map(drifts(layout).map(({ piece, drift }) => [piece, drift]));
        for (const { a, b, from, facing, gap, jump } of seams(layout)) {
          // Where a run closes on itself its two ends meet, which lie a whole run apart.
          if (facing.x + facing.y !== from.x + from.y + gap) continue;
          const [driftA, driftB] = [byId.get(a), byId.get(b)];
          if (!driftA || !driftB || jump === null) continue;
          expect([driftB.along - driftA.along, driftB.across - driftA.across]).toEqual([jump.along.min, jump.across.min]);
        }
      }),
    );
  });

  test("a piece from another board or turned the other way has none; without a placed set there are none", () => {
    const loose = accepted(letLoose(tightRow(0), "p2"));
    expect(along(accepted(placeGroup(loose, "loose-1", "b2", { x: um(0), y: um(0) }, 0)))[1]).toBeUndefined();
    expect(along(accepted(turnGroup(loose, "loose-1")))[1]).toBeUndefined();
    expect(drifts({ ...loose, groups: loose.groups.map((group) => ({ ...group, placement: null })) })).toEqual([]);
  });

  test("at the anchor of the set the wood shows without drift: the uncut board and the placement agree there", () => {
    fc.assert(
      fc.property(arbitrarySet, (layout) => {
        const left = accepted(changeAnchor(layout, { piece: "p1" }, { piece: "p1" }));
        expect(drifts(left)[0]).toEqual({ piece: "p1", drift: { along: 0, across: 0 } });
        expect(drifts(left)).toHaveLength(pieceIdsOf(layout.face).length);
      }),
    );
  });
});
