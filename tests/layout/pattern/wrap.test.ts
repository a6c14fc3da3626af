import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type FaceLayout,
  faceFaults,
  facePieces,
  faceSize,
  freshLayout,
  freshWrap,
  layOut,
  lyingPieces,
  type PlanPoint,
  placeGroup,
  rectToStock,
  seams,
  um,
  umFromMm,
  type WrapCorner,
  type WrapFace,
  wrapPlan,
} from "@/lib/layout";
import { accepted, arbitraryCorner, arbitrarySetOf, arbitraryWrapFace, umBetween } from "../arbitrary-layout";

const saw = { kerf: umFromMm(3), cleanUpBefore: um(0), cleanUpAfter: um(0) };
const cuts = { crosscut: saw, rip: saw, spacing: "tight" as const };
const mitre: WrapCorner = { kind: "mitre", turnDeg: 90, parting: "squareThenBevels" };

/** Sides of 400 and 250 mm, 90 mm high, of 20 mm stock. */
function box(corner: WrapCorner, closed = true): WrapFace {
  const sides = [400, 250, 400, 250].map(umFromMm);
  return freshWrap({ sides, height: umFromMm(90), thickness: umFromMm(20), grain: "horizontal", corner, closed });
}

const planOf = (face: WrapFace, change: Partial<FaceLayout> = {}) => {
  const plan = wrapPlan({ ...freshLayout(face, cuts), ...change });
  if (plan === null) throw new Error("no plan");
  return plan;
};

describe("a corner", () => {
  test("a mitre of 45 degrees in 20 mm stock: parted square the show face loses the kerf of 3 mm and the inner face 43", () => {
    const [corner] = planOf(box(mitre)).corners;
    expect(corner).toMatchObject({ hungGap: 0, bevelDeg: 45, parted: { way: "squareThenBevels", jump: 3_000 } });
    expect(corner?.parted?.loss).toEqual({ show: 3_000, inner: 43_000 });
  });

  test("parted by one bevel the show face loses kerf / cos 45° = 4.243 mm and the inner face 44.243", () => {
    const [corner] = planOf(box({ ...mitre, parting: "oneBevel" })).corners;
    expect(corner?.parted).toMatchObject({ way: "oneBevel", loss: { show: 4_243, inner: 44_243 }, jump: 4_243 });
  });

  test("a square butt is cut square: the covering side's end hangs 20 mm wide, and the figure runs on behind it where the spacing follows", () => {
    const [corner] = planOf(box({ kind: "butt", turnDeg: 90, covers: "before" })).corners;
    expect(corner).toMatchObject({ hungGap: 20_000, bevelDeg: 0 });
    expect(corner?.parted).toEqual({ way: "square", loss: { show: 3_000, inner: 3_000 }, spacing: 3_000, jump: -17_000 });
    const [followed] = planOf(box({ kind: "butt", turnDeg: 90, covers: "before" }), { spacing: "followGap" }).corners;
    expect(followed?.parted).toMatchObject({ spacing: 20_000, jump: 0 });
  });

  test("a butt at 60 degrees shows T / sin 60° of the covering end; the inner faces reach T / tan 60° beyond", () => {
    const [corner] = planOf(box({ kind: "butt", turnDeg: 60, covers: "after" })).corners;
    expect(corner).toMatchObject({ hungGap: 23_094, bevelDeg: 30, parted: { way: "squareThenBevels" } });
    expect(corner?.parted?.loss).toEqual({ show: 3_000 + 2 * 11_547, inner: 3_000 });
  });

  test("for any thickness, turn and kerf the losses are those of the closed form, to the micrometre", () => {
    fc.assert(
      fc.property(
        umBetween(6_000, 40_000),
        fc.double({ min: 10, max: 130, noNaN: true }),
        umBetween(1_000, 4_000),
        fc.boolean(),
        (thickness, turnDeg, kerf, oneBevel) => {
          const corner: WrapCorner = { kind: "mitre", turnDeg, parting: oneBevel ? "oneBevel" : "squareThenBevels" };
          const face = { ...box(corner), thickness };
          const loss = planOf(face, { crosscut: { ...saw, kerf } }).corners[0]?.parted?.loss;
          const half = ((turnDeg / 2) * Math.PI) / 180;
          const show = oneBevel ? kerf / Math.cos(half) : kerf;
          expect(Math.abs((loss?.show ?? 0) - show)).toBeLessThanOrEqual(0.5);
          expect(Math.abs((loss?.inner ?? 0) - show - 2 * thickness * Math.tan(half))).toBeLessThanOrEqual(1.5);
        },
      ),
    );
  });
});

describe("the sides", () => {
  test("inner faces of a mitred box are shorter by the thickness at each end, of an open run only at its corners", () => {
    expect(planOf(box(mitre)).sides.map(({ show, inner }) => [show, inner])).toEqual([
      [400_000, 360_000],
      [250_000, 210_000],
      [400_000, 360_000],
      [250_000, 210_000],
    ]);
    expect(planOf(box(mitre, false)).sides.map(({ inner }) => inner)).toEqual([380_000, 210_000, 360_000, 230_000]);
  });

  test("the wood that is needed holds the sides, the losses between them and the clean-up at the ends", () => {
    const { wood, run } = planOf(box(mitre), { crosscut: { ...saw, cleanUpBefore: um(500), cleanUpAfter: um(200) } });
    expect(wood).toEqual({ length: 1_300_000 + 3 * 3_700 + 700, width: 90_000 });
    expect(run).toBe(1_300_000);
  });

  test("assembled they hang at the gap of every corner, and the face has its finished size", () => {
    fc.assert(
      fc.property(arbitraryWrapFace, (face) => {
        expect(faceFaults(face)).toEqual([]);
        const rects = facePieces({ face }).map(({ rect }) => rect);
        const plan = planOf(face);
        rects.slice(1).forEach((rect, index) => {
          const before = rects[index];
          const hung = rect.x - (before?.x ?? 0) - (before?.width ?? 0);
          expect(hung).toBe(plan.corners[index]?.hungGap);
        });
        const last = rects.at(-1);
        expect(faceSize(face)).toEqual({ width: (last?.x ?? 0) + (last?.width ?? 0), height: face.height });
        expect(plan.run).toBe(faceSize(face).width);
      }),
    );
  });
});

describe("the jump", () => {
  test("from the maps is spacing less hung gap at every corner, but at the one that closes the run: there it is the whole run", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryWrapFace), (layout) => {
        const plan = wrapPlan(layout);
        const sign = (layout.groups[0]?.placement?.turns ?? 0) >= 2 ? -1 : 1;
        const spaced = layout.face.sides.reduce(
          (sum, side, index) => sum + side + (plan?.corners[index]?.parted?.spacing ?? 0),
          0,
        );
        const found = seams(layout);
        expect(found).toHaveLength(plan?.corners.length ?? -1);
        found.forEach(({ jump, gap }, index) => {
          const corner = plan?.corners[index];
          expect(gap).toBe(corner?.hungGap);
          const [onRun, upright] = layout.face.grain === "horizontal" ? [jump?.along, jump?.across] : [jump?.across, jump?.along];
          const expected = corner?.parted ? corner.parted.jump : -(spaced + gap);
          expect([sign * (onRun?.min ?? Number.NaN) + 0, upright?.min]).toEqual([expected + 0, 0]);
          expect(onRun?.max).toBe(onRun?.min);
        });
      }),
    );
  });
});

describe("folded", () => {
  const near = (p: PlanPoint, q: PlanPoint) => Math.hypot(p.x - q.x, p.y - q.y) < 3;

  test("a mitred box and a mitred hexagon close; a box with a side too long does not, and says by how much", () => {
    expect(planOf(box(mitre)).closure).toEqual({ off: 0, turnOffDeg: 0 });
    const hexagon = freshWrap({
      sides: Array.from({ length: 6 }, () => umFromMm(200)),
      height: umFromMm(100),
      thickness: umFromMm(18),
      grain: "vertical",
      corner: { kind: "mitre", turnDeg: 60, parting: "oneBevel" },
      closed: true,
    });
    expect(planOf(hexagon).closure).toEqual({ off: 0, turnOffDeg: 0 });
    const long = { ...box(mitre), sides: [412, 250, 400, 250].map(umFromMm) };
    expect(planOf(long).closure).toEqual({ off: 12_000, turnOffDeg: 0 });
    expect(planOf(box(mitre, false)).closure).toBeNull();
  });

  test("sides meet as their corners say, on the show face and on the inner face", () => {
    fc.assert(
      fc.property(arbitraryWrapFace, arbitraryCorner, (any, first) => {
        const face = { ...any, corners: any.corners.map((corner, index) => (index === 0 ? first : corner)) };
        const { fold } = planOf(face);
        fold.slice(1).forEach((after, index) => {
          const [before, corner] = [fold[index], face.corners[index]];
          if (before === undefined || corner === undefined) throw new Error("no corner");
          expect(after.directionDeg - before.directionDeg).toBeCloseTo(corner.turnDeg, 9);
          if (corner.kind === "gap") {
            // Isosceles about the corner: half the gap on either side of it.
            const across = Math.hypot(after.show.from.x - before.show.to.x, after.show.from.y - before.show.to.y);
            expect(across).toBeCloseTo(corner.gap * Math.cos((corner.turnDeg * Math.PI) / 360), 3);
          } else if (corner.kind === "mitre") {
            expect(near(before.show.to, after.show.from)).toBe(true);
            expect(near(before.inner.to, after.inner.from)).toBe(true);
          } else {
            // The covering side's end lies in the other's show plane and meets its show edge with its inner arris; inside both inner planes meet.
            const covering = corner.covers === "before" ? before.inner.to : after.inner.from;
            const covered = corner.covers === "before" ? after.show.from : before.show.to;
            expect(near(covering, covered)).toBe(true);
            const [innerEnd, other] =
              corner.covers === "before" ? [after.inner.from, before.inner] : [before.inner.to, after.inner];
            const [dx, dy] = [other.to.x - other.from.x, other.to.y - other.from.y];
            const off = ((innerEnd.x - other.from.x) * dy - (innerEnd.y - other.from.y) * dx) / Math.hypot(dx, dy);
            expect(Math.abs(off)).toBeLessThan(3);
          }
        });
        for (const { show, inner } of fold) {
          const length = ({ from, to }: typeof show) => Math.hypot(to.x - from.x, to.y - from.y);
          const plan = planOf(face).sides[fold.findIndex((one) => one.show === show)];
          expect(Math.abs(length(inner) - (plan?.inner ?? length(inner)))).toBeLessThan(1e-3);
        }
      }),
    );
  });
});

describe("in the wood", () => {
  test("the run read from its other end lies mirrored", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryWrapFace), (any) => {
        const layout = { ...any, face: { ...any.face, grain: "horizontal" as const, closed: false }, anchorX: "left" as const };
        const corners = layout.face.corners.slice(0, layout.face.sides.length - 1);
        const turned = corners.map(
          (corner): WrapCorner =>
            corner.kind === "butt" ? { ...corner, covers: corner.covers === "before" ? "after" : "before" } : corner,
        );
        const { cleanUpBefore, cleanUpAfter } = layout.crosscut;
        const mirrored = {
          ...layout,
          face: { ...layout.face, sides: [...layout.face.sides].reverse(), corners: [...turned].reverse() },
          crosscut: { ...layout.crosscut, cleanUpBefore: cleanUpAfter, cleanUpAfter: cleanUpBefore },
        };
        const spans = (face: WrapFace, one: FaceLayout) =>
          layOut(accepted(placeGroup({ ...one, face }, "set", "b1", { x: um(0), y: um(0) }, 0))).map(
            ({ outline, stockFromFace }) => {
              const [from, , to] = outline;
              if (from === undefined || to === undefined) throw new Error("no outline");
              const { x, width } = rectToStock(stockFromFace, { ...from, width: um(to.x - from.x), height: um(1) });
              return [x, x + width] as const;
            },
          );
        const one = spans({ ...layout.face, corners }, layout);
        const other = spans(mirrored.face, mirrored);
        const end = one.at(-1)?.[1] ?? 0;
        expect(other.map(([from, to]) => [end - to, end - from]).reverse()).toEqual(one.map(([from, to]) => [from, to]));
      }),
    );
  });

  test("every blank holds its side on the show face and on the inner face", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryWrapFace), (layout) => {
        const plan = wrapPlan(layout);
        for (const { id, blank } of lyingPieces(layout)) {
          const side = plan?.sides[Number(id.slice(1)) - 1];
          const { along, across } = blank;
          const run = layout.face.grain === "horizontal" ? along : across;
          expect(run.to - run.from).toBeGreaterThanOrEqual(Math.max(side?.show ?? 0, side?.inner ?? 0));
        }
      }),
    );
  });

  test("faults name a corner too many, a turn that is none, a side whose bevels meet", () => {
    expect(faceFaults({ ...box(mitre), corners: [mitre, mitre, mitre] })).toEqual([
      { fault: "corner-count", corners: 3, needed: 4 },
    ]);
    expect(faceFaults({ ...box(mitre, false), corners: [mitre, { ...mitre, turnDeg: 180 }, mitre] })).toEqual([
      { fault: "turn-out-of-range", corner: 1 },
    ]);
    expect(faceFaults({ ...box(mitre), sides: [400, 250, 40, 250].map(umFromMm) })).toEqual([
      { fault: "no-inner-face", side: 2, by: 1 },
    ]);
    expect(faceFaults({ ...box(mitre), sides: [umFromMm(400)], corners: [mitre] })).toEqual([
      { fault: "too-few-sides", sides: 1 },
    ]);
  });
});
