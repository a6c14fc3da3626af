/** Blanks glued up from boards: where each board lies, what the blank is, and what is carried over. */
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type BlankMember,
  type BlankPlan,
  type ComposedBlank,
  composeBlank,
  type KeepClearShape,
  movedPoint,
  outsideFault,
  polygonFault,
  type StockPoint,
  um,
  umFromMm,
} from "@/lib/layout";
import { arbitraryKeepClear, starPolygon, umBetween } from "../arbitrary-layout";

const p = (x: number, y: number): StockPoint => ({ x: um(x), y: um(y) });

const member = (id: string, lengthMm: number, widthMm: number, more: Partial<BlankMember> = {}): BlankMember => ({
  id,
  length: umFromMm(lengthMm),
  width: umFromMm(widthMm),
  thickness: umFromMm(27),
  outline: null,
  keepClear: [],
  glueLines: [],
  endForEnd: false,
  along: um(0),
  trim: { upper: um(0), lower: um(0) },
  ...more,
});

const plan = (members: readonly BlankMember[], jointingMm = 1.5): BlankPlan => ({ members, jointing: umFromMm(jointingMm) });

function composed(given: BlankPlan): ComposedBlank {
  const outcome = composeBlank(given);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.refusal));
  return outcome.blank;
}

const refusal = (given: BlankPlan) => {
  const outcome = composeBlank(given);
  return outcome.ok ? null : outcome.refusal;
};

describe("two boards", () => {
  const blank = composed(plan([member("a", 2400, 200), member("b", 2300, 180, { endForEnd: true, along: umFromMm(40) })]));

  test("lose the jointing at the edges that are glued and at no other", () => {
    expect(blank.strips.map(({ takes }) => takes)).toEqual([
      { upper: 0, lower: 1500 },
      { upper: 1500, lower: 0 },
    ]);
    expect([blank.length, blank.width]).toEqual([2_400_000, 377_000]);
  });

  test("meet at one glue line, which knows who lies on either side", () => {
    expect(blank.glueLines).toEqual([{ across: 198_500, above: "a", below: "b" }]);
    expect(blank.joints).toEqual([
      { across: 198_500, above: "a", below: "b", from: 40_000, to: 2_340_000, soundAlong: 2_300_000 },
    ]);
  });

  test("lie where their maps say: shifted, or turned by half a turn in their own plane", () => {
    const [a, b] = blank.strips;
    expect(movedPoint(a?.blankFromMember ?? never(), p(10_000, 20_000))).toEqual(p(10_000, 20_000));
    // The right end of the turned board is its left end now, its lower edge the upper one, 1.5 mm of it jointed away.
    expect(movedPoint(b?.blankFromMember ?? never(), p(2_300_000, 178_500))).toEqual(p(40_000, 198_500));
    expect(movedPoint(b?.blankFromMember ?? never(), p(0, 0))).toEqual(p(2_340_000, 377_000));
  });

  test("of different lengths leave an outline with a step where one ends", () => {
    const corners = [
      p(0, 0),
      p(2_400_000, 0),
      p(2_400_000, 198_500),
      p(2_340_000, 198_500),
      p(2_340_000, 377_000),
      p(40_000, 377_000),
      p(40_000, 198_500),
      p(0, 198_500),
    ];
    expect(fromFirst(blank.outline ?? [])).toEqual(corners);
    expect(areaOf(blank.outline ?? [])).toBe(2_400_000 * 198_500 + 2_300_000 * 178_500);
  });

  test("of one length, flush, are usable as a whole", () => {
    expect(composed(plan([member("a", 2400, 200), member("b", 2400, 180)])).outline).toBeNull();
  });
});

/** A ring begins anywhere: here at its upper left corner. */
function fromFirst(corners: readonly StockPoint[]): readonly StockPoint[] {
  const first = corners.findIndex(({ x, y }) => corners.every((other) => y < other.y || (y === other.y && x <= other.x)));
  return [...corners.slice(first), ...corners.slice(0, first)];
}

const ringsOf = (areas: ComposedBlank["keepClear"]) =>
  areas.map(({ area }) => (area.shape === "polygon" ? fromFirst(area.points) : []));

function never(): never {
  throw new Error("there is no such strip");
}

function areaOf(corners: readonly StockPoint[]): number {
  return (
    corners.reduce((sum, from, index) => {
      const to = corners[(index + 1) % corners.length] ?? from;
      return sum + from.x * to.y - to.x * from.y;
    }, 0) / 2
  );
}

describe("what is drawn on the boards", () => {
  test("an outline that stops short of its joint is joined where it reaches it, and the joint says how much of it is sound", () => {
    const wane = [
      p(0, 0),
      p(1_000_000, 0),
      p(1_000_000, 100_000),
      p(600_000, 100_000),
      p(500_000, 80_000),
      p(400_000, 100_000),
      p(0, 100_000),
    ];
    const given = plan([member("a", 1000, 100, { outline: wane }), member("b", 1000, 100)], 0);
    const { outline, keepClear, joints, leftOut } = composed(given);
    // A dip in one edge only, closed by the straight edge of the other board: no way round it, so it is kept clear.
    expect(outline).toBeNull();
    expect(keepClear.map(({ from, kind }) => ({ from, kind }))).toEqual([{ from: null, kind: "other" }]);
    expect(ringsOf(keepClear)).toEqual([[p(500_000, 80_000), p(600_000, 100_000), p(400_000, 100_000)]]);
    expect(joints[0]?.soundAlong).toBe(800_000);
    expect(leftOut).toBe(0);
  });

  test("two outlines that nowhere reach their joint: the larger stays, and it is said that a part is left out", () => {
    const short = (width: number) => [p(0, 5_000), p(1_000_000, 5_000), p(1_000_000, width - 5_000), p(0, width - 5_000)];
    const given = plan(
      [member("a", 1000, 100, { outline: short(100_000) }), member("b", 1000, 200, { outline: short(200_000) })],
      0,
    );
    const { outline, leftOut, joints } = composed(given);
    expect(fromFirst(outline ?? [])).toEqual([p(0, 105_000), p(1_000_000, 105_000), p(1_000_000, 295_000), p(0, 295_000)]);
    expect(leftOut).toBe(1);
    expect(joints[0]?.soundAlong).toBe(0);
  });

  test("trimming takes the edge back to where it is sound", () => {
    const short = [p(0, 5_000), p(1_000_000, 5_000), p(1_000_000, 95_000), p(0, 95_000)];
    const trim = { upper: um(5_000), lower: um(5_000) };
    const given = plan([member("a", 1000, 100, { outline: short, trim }), member("b", 1000, 100, { outline: short, trim })], 0);
    expect(composed(given)).toMatchObject({ outline: null, width: 180_000, joints: [{ soundAlong: 1_000_000 }], leftOut: 0 });
  });

  test("glue lines that a board came with stay on it, turned with it, unless they are trimmed away", () => {
    const glued = member("b", 1000, 100, { glueLines: [um(30_000), um(98_000)], endForEnd: true });
    const { glueLines } = composed(plan([member("a", 1000, 100), glued], 5));
    expect(glueLines).toEqual([
      { across: 95_000, above: "a", below: "b" },
      // 100 − 30 from its upper edge as it lies, 5 of which are jointed away; the one at 98 is gone with them.
      { across: 95_000 + 70_000 - 5_000, above: "b", below: "b" },
    ]);
  });

  test("an area trimmed away is left behind; a polygon over the joint ends there", () => {
    const square = (id: string, y: number) => ({
      id,
      kind: "check" as const,
      area: { shape: "polygon" as const, points: [p(10_000, y), p(20_000, y), p(20_000, y + 10_000), p(10_000, y + 10_000)] },
    });
    const drawn = member("a", 1000, 100, {
      keepClear: [square("gone", 91_000), square("cut", 85_000)],
      trim: { upper: um(0), lower: um(8_500) },
    });
    const { keepClear } = composed(plan([drawn, member("b", 1000, 100)]));
    expect(keepClear.map(({ from, kind }) => ({ from, kind }))).toEqual([{ from: { member: "a", area: "cut" }, kind: "check" }]);
    expect(ringsOf(keepClear)).toEqual([[p(10_000, 85_000), p(20_000, 85_000), p(20_000, 90_000), p(10_000, 90_000)]]);
  });
});

describe("boards that cannot be glued are refused, with by how much:", () => {
  test.each<[string, BlankPlan, object]>([
    ["one alone", plan([member("a", 1000, 100)]), { reason: "too-few" }],
    ["one twice", plan([member("a", 1000, 100), member("a", 1000, 100)]), { reason: "twice", id: "a" }],
    [
      "one trimmed to nothing",
      plan([member("a", 1000, 100), member("b", 1000, 100, { trim: { upper: um(60_000), lower: um(40_000) } })]),
      { reason: "nothing-left", id: "b", by: 1_501 },
    ],
    [
      "two that do not meet along the grain",
      plan([member("a", 1000, 100), member("b", 1000, 100, { along: um(1_000_004) })]),
      { reason: "apart", above: "a", below: "b", by: 5 },
    ],
    [
      "thicknesses too far apart",
      plan([member("a", 1000, 100), member("b", 1000, 100, { thickness: um(29_001) })]),
      { reason: "thickness", thin: "a", thick: "b", by: 2_001 },
    ],
  ])("%s", (_, given, why) => expect(refusal(given)).toEqual(why));
});

/** Boards with outlines and areas as makers draw them, and worse; turned, shifted, trimmed. */
const arbitraryMember = (id: string) =>
  fc
    .record({
      length: umBetween(600_000, 1_000_000),
      width: umBetween(120_000, 260_000),
      endForEnd: fc.boolean(),
      along: umBetween(-200_000, 200_000),
      trim: fc.record({ upper: umBetween(0, 20_000), lower: umBetween(0, 20_000) }),
      radii: fc.option(fc.array(umBetween(20_000, 500_000), { minLength: 4, maxLength: 14 })),
      keepClear: fc.array(arbitraryKeepClear, { maxLength: 2 }),
      glueLines: fc.array(umBetween(1, 119_999), { maxLength: 1 }),
    })
    .map(({ radii, keepClear, ...rest }): BlankMember => {
      const { length, width } = rest;
      const within =
        radii && starPolygon({ x: length / 2, y: width / 2 }, radii).map(({ x, y }) => p(held(x, length), held(y, width)));
      const outline = within && polygonFault(within) === null ? within : null;
      const areas = keepClear.map((area, index) => ({ id: `${id}${index}`, kind: "knot" as const, area }));
      return { ...rest, id, thickness: um(27_000), outline, keepClear: areas };
    });

const held = (value: number, most: number) => Math.min(most, Math.max(0, value));

const arbitraryPlan = fc.integer({ min: 2, max: 4 }).chain((count) =>
  fc.record({
    members: fc.tuple(...Array.from({ length: count }, (_, index) => arbitraryMember("abcd"[index] ?? "?"))),
    jointing: umBetween(0, 3_000),
  }),
);

describe("any blank", () => {
  const forAll = (check: (given: BlankPlan, blank: ComposedBlank) => void, numRuns = 25) =>
    fc.assert(
      fc.property(arbitraryPlan, (given) => {
        const outcome = composeBlank(given);
        if (!outcome.ok) return expect(["nothing-left", "apart", "no-wood"]).toContain(outcome.refusal.reason);
        check(given, outcome.blank);
      }),
      { numRuns },
    );

  test("is as wide as what is left of its boards, and reaches from the first left end to the last right end", () => {
    forAll(({ members, jointing }, { length, width, strips }) => {
      const taken = members.reduce((sum, { width: w, trim }) => sum + w - trim.upper - trim.lower, 0);
      expect(width).toBe(taken - 2 * jointing * (members.length - 1));
      const ends = members.map((one) => [one.along, one.along + one.length]);
      expect(length).toBe(Math.max(...ends.map(([, end]) => end ?? 0)) - Math.min(...ends.map(([start]) => start ?? 0)));
      expect(Math.min(...strips.map(({ rect }) => rect.x))).toBe(0);
    });
  });

  test("has strips that touch and never overlap, each filled by its board and by nothing trimmed off it", () => {
    forAll(({ members }, { strips, width }) => {
      let y = 0;
      for (const [index, { rect, takes, blankFromMember }] of strips.entries()) {
        expect(rect.y).toBe(y);
        y += rect.height;
        const one = members[index];
        if (!one) throw new Error("a strip without a board");
        const corners = [p(0, 0), p(one.length, one.width)].map((corner) => movedPoint(blankFromMember, corner));
        const ys = corners.map((corner) => corner.y).sort((q, r) => q - r);
        const xs = corners.map((corner) => corner.x).sort((q, r) => q - r);
        expect(xs).toEqual([rect.x, rect.x + rect.width]);
        expect(ys).toEqual([rect.y - takes.upper, rect.y + rect.height + takes.lower]);
      }
      expect(y).toBe(width);
    });
  });

  test("calls wood usable exactly where its board does, and where it hangs together with the rest", () => {
    forAll(({ members }, { strips, outline, keepClear, length, width, leftOut }) => {
      const usable = (at: StockPoint) => {
        const index = strips.findIndex(({ rect }) => at.y > rect.y && at.y < rect.y + rect.height);
        const [strip, one] = [strips[index], members[index]];
        if (!strip || !one || at.x <= strip.rect.x || at.x >= strip.rect.x + strip.rect.width) return false;
        const own = ownPoint(strip.blankFromMember, at);
        return one.outline === null || inside(one.outline, own);
      };
      const holes = keepClear
        .filter(({ from }) => from === null)
        .map(({ area }) => (area.shape === "polygon" ? area.points : []));
      for (let i = 0; i < 40; i++) {
        // Off the whole micrometres of the corners, so that none lies on an edge, and away from where rounding moved one.
        const at = {
          x: um(Math.round(((i * 7919) % 1009) * (length / 1009))),
          y: um(Math.round(((i * 104729) % 997) * (width / 997))),
        };
        if (nearEdge(at, [outline ?? [], ...holes, ...members.flatMap((one, k) => outlineIn(one, strips[k]))], 4)) continue;
        const said =
          (outline === null ? onRectangle(at, length, width) : inside(outline, at)) && !holes.some((hole) => inside(hole, at));
        if (said) expect(usable(at)).toBe(true);
        else if (leftOut === 0 && onRectangle(at, length, width)) expect(usable(at)).toBe(false);
      }
    });
  });

  test("has an outline that lies on it and crosses itself nowhere", () => {
    forAll((_, { outline, keepClear, length, width }) => {
      if (outline) {
        expect(outsideFault(outline, { length, width })).toBeNull();
        expect(polygonFault(outline)).toBeNull();
      }
      for (const { area } of keepClear) if (area.shape === "polygon") expect(polygonFault(area.points)).toBeNull();
    });
  });

  test("keeps clear of what its boards keep clear of, wherever that lies in their strips", () => {
    forAll(({ members }, { strips, keepClear }) => {
      for (const [index, { id, keepClear: areas }] of members.entries()) {
        const strip = strips[index];
        if (!strip) continue;
        for (const { id: areaId, area } of areas) {
          for (const own of placesIn(area)) {
            const at = movedPoint(strip.blankFromMember, own);
            const { x, y, width, height } = strip.rect;
            if (at.x <= x + 2 || at.x >= x + width - 2 || at.y <= y + 2 || at.y >= y + height - 2) continue;
            const carried = keepClear.find(({ from }) => from?.member === id && from.area === areaId);
            expect(carried && reaches(carried.area, at)).toBe(true);
          }
        }
      }
    });
  });

  test("turned as a whole, by turning every board end for end in the other order, is the same blank turned", () => {
    forAll(({ members, jointing }, blank) => {
      const right = Math.max(...members.map(({ along, length }) => along + length));
      const turned = members.toReversed().map((one) => ({
        ...one,
        endForEnd: !one.endForEnd,
        along: um(right - one.along - one.length),
        trim: { upper: one.trim.lower, lower: one.trim.upper },
      }));
      const other = composed({ members: turned, jointing });
      expect([other.length, other.width]).toEqual([blank.length, blank.width]);
      // Cut corners are rounded to whole micrometres, halves upwards, which a turned blank does the other way.
      const turnedJoints = other.joints.toReversed();
      for (const [index, { across, soundAlong }] of blank.joints.entries()) {
        expect(blank.width - (turnedJoints[index]?.across ?? 0)).toBe(across);
        expect(Math.abs((turnedJoints[index]?.soundAlong ?? 0) - soundAlong)).toBeLessThanOrEqual(30);
      }
      const most = 2 * (blank.length + blank.width);
      expect(Math.abs(areaOf(other.outline ?? []) - areaOf(blank.outline ?? []))).toBeLessThanOrEqual(most);
    });
  });
});

function ownPoint({ a, d, tx, ty }: { a: number; d: number; tx: number; ty: number }, { x, y }: StockPoint): StockPoint {
  return p((x - tx) * a, (y - ty) * d);
}

function inside(points: readonly StockPoint[], { x, y }: StockPoint): boolean {
  let odd = false;
  for (const [index, to] of points.entries()) {
    const from = points.at(index - 1) ?? to;
    if (from.y > y !== to.y > y && x < from.x + ((y - from.y) / (to.y - from.y)) * (to.x - from.x)) odd = !odd;
  }
  return odd;
}

const onRectangle = ({ x, y }: StockPoint, length: number, width: number) => x > 0 && y > 0 && x < length && y < width;

function outlineIn({ outline }: BlankMember, strip: ComposedBlank["strips"][number] | undefined): StockPoint[][] {
  if (!strip) return [];
  const { x, y, width, height } = strip.rect;
  const rect = [p(x, y), p(x + width, y), p(x + width, y + height), p(x, y + height)];
  return outline ? [rect, outline.map((corner) => movedPoint(strip.blankFromMember, corner))] : [rect];
}

function nearEdge({ x, y }: StockPoint, rings: readonly (readonly StockPoint[])[], reach: number): boolean {
  return rings.some((ring) =>
    ring.some((to, index) => {
      const from = ring.at(index - 1) ?? to;
      const [dx, dy] = [to.x - from.x, to.y - from.y];
      const squared = dx * dx + dy * dy;
      const t = squared === 0 ? 0 : Math.min(1, Math.max(0, ((x - from.x) * dx + (y - from.y) * dy) / squared));
      return Math.hypot(x - from.x - t * dx, y - from.y - t * dy) <= reach;
    }),
  );
}

/** Its middle and places halfway out. */
function placesIn(area: KeepClearShape): StockPoint[] {
  if (area.shape === "polygon") {
    const middle = area.points.reduce(
      (sum, { x, y }) => ({ x: sum.x + x / area.points.length, y: sum.y + y / area.points.length }),
      { x: 0, y: 0 },
    );
    const places = [middle, ...area.points.map(({ x, y }) => ({ x: (x + middle.x) / 2, y: (y + middle.y) / 2 }))].map(
      ({ x, y }) => p(Math.round(x), Math.round(y)),
    );
    return places.filter((at) => inside(area.points, at) && !nearEdge(at, [area.points], 3));
  }
  const { centre, radiusX, radiusY, turnDeg } = area;
  const turn = (turnDeg * Math.PI) / 180;
  return [0, 1, 2, 3, 4, 5].map((step) => {
    const [along, across] = [0.9 * radiusX * Math.cos(step), 0.9 * radiusY * Math.sin(step)];
    return p(
      Math.round(centre.x + along * Math.cos(turn) - across * Math.sin(turn)),
      Math.round(centre.y + along * Math.sin(turn) + across * Math.cos(turn)),
    );
  });
}

function reaches(area: KeepClearShape, at: StockPoint): boolean {
  if (area.shape === "polygon") return inside(area.points, at) || nearEdge(at, [area.points], 2);
  const turn = (area.turnDeg * Math.PI) / 180;
  const [dx, dy] = [at.x - area.centre.x, at.y - area.centre.y];
  return (
    ((dx * Math.cos(turn) + dy * Math.sin(turn)) / area.radiusX) ** 2 +
      ((dy * Math.cos(turn) - dx * Math.sin(turn)) / area.radiusY) ** 2 <=
    1
  );
}
