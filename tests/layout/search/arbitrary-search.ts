/**
 * Small boards with a picture, a layout with a group to lay on them, and what stands in the way: knots, an outline, wood that is spoken
 * for, loose pieces on the same board or another. Small enough that every place can be tried one by one.
 */
import fc from "fast-check";
import {
  type BoardFace,
  type FaceLayout,
  freshLayout,
  gridFace,
  letLoose,
  pieceIdsOf,
  placeGroup,
  type SearchPicture,
  turnsAlongGrain,
  um,
  type Weights,
} from "@/lib/layout";
import { accepted, arbitraryCut, arbitraryGrain, arbitrarySpacing, boardOf, starPolygon, umBetween } from "../arbitrary-layout";

/** Rings that drift and bend, grit on them, and a plain patch without any figure. */
export function woodPicture(length: number, width: number, seed: number): SearchPicture {
  const [columns, rows] = [Math.ceil(length / 500), Math.ceil(width / 500)];
  const grey = new Uint8Array(columns * rows);
  let grit = seed;
  const patch = { x: (seed * 7) % columns, y: (seed * 13) % rows };
  for (let x = 0; x < columns; x++) {
    for (let y = 0; y < rows; y++) {
      grit = (Math.imul(grit, 1_103_515_245) + 12_345) >>> 0;
      const ring = 128 + 50 * Math.sin((y + 4 * Math.sin((x + seed) / 37)) / (3 + (seed % 5)) + x / 90);
      const isPlain = Math.abs(x - patch.x) < 14 && Math.abs(y - patch.y) < 30;
      grey[x * rows + y] = isPlain ? 120 : Math.round(ring + ((grit >>> 24) - 128) / 8);
    }
  }
  return { width: columns, height: rows, grey };
}

const size = fc.constantFrom(21_000, 21_437, 24_000, 26_500, 30_251).map(um);

/** One to three fronts along the grain, mostly two, and one or two across it, in one set, not laid on wood. */
export const arbitrarySmallSet: fc.Arbitrary<FaceLayout> = fc
  .tuple(
    fc.oneof(
      { weight: 4, arbitrary: fc.array(size, { minLength: 2, maxLength: 2 }) },
      { weight: 1, arbitrary: fc.array(size, { minLength: 1, maxLength: 3 }) },
    ),
    fc.oneof(
      { weight: 3, arbitrary: fc.array(size, { minLength: 1, maxLength: 1 }) },
      { weight: 1, arbitrary: fc.array(size, { minLength: 2, maxLength: 2 }) },
    ),
    umBetween(0, 3_000),
    arbitraryGrain,
    arbitraryCut,
    arbitraryCut,
    arbitrarySpacing,
  )
  .map(([many, few, gap, grain, crosscut, rip, spacing]) => {
    const [columns, rows] = grain === "horizontal" ? [many, few] : [few, many];
    return freshLayout(gridFace(columns, rows, gap, gap, grain), { crosscut, rip, spacing });
  });

/** The set with up to two pieces let loose and laid somewhere, turned either way, on the board itself or on "b2". */
export const arbitraryTask: fc.Arbitrary<FaceLayout> = arbitrarySmallSet.chain((set) => {
  const ids = pieceIdsOf(set.face);
  const loosening = fc.tuple(
    fc.constantFrom(...ids),
    fc.boolean(),
    fc.constantFrom("b1", "b2", "b2"),
    umBetween(0, 60_000),
    umBetween(0, 20_000),
  );
  return fc.array(loosening, { maxLength: ids.length > 2 ? 2 : ids.length - 1 }).map((loose) => {
    let layout = set;
    for (const [piece, turned, stockId, x, y] of loose) {
      const change = letLoose(layout, piece);
      const group = change.ok ? change.layout.groups.at(-1) : undefined;
      if (!change.ok || group === undefined) continue;
      const turns = turnsAlongGrain(layout.face.grain)[turned ? 1 : 0];
      layout = accepted(placeGroup(change.layout, group.id, stockId, { x, y }, turns));
    }
    return layout;
  });
});

const arbitraryKnot = fc.oneof(
  fc.record({
    shape: fc.constant("ellipse" as const),
    centre: fc.record({ x: umBetween(0, 110_000), y: umBetween(0, 60_000) }),
    radiusX: umBetween(500, 9_000),
    radiusY: umBetween(500, 9_000),
    turnDeg: fc.integer({ min: -180, max: 180 }),
  }),
  fc
    .record({
      centre: fc.record({ x: umBetween(0, 110_000), y: umBetween(0, 60_000) }),
      radii: fc.array(umBetween(500, 9_000), { minLength: 3, maxLength: 7 }),
    })
    .map(({ centre, radii }) => ({ shape: "polygon" as const, points: starPolygon(centre, radii) })),
);

/** Corners on whole millimetres, where touches and half micrometres come up. */
const arbitraryRoundKnot = fc
  .record({
    x: fc.integer({ min: 0, max: 110 }),
    y: fc.integer({ min: 0, max: 60 }),
    width: fc.integer({ min: 1, max: 9 }),
    height: fc.integer({ min: 1, max: 9 }),
    slant: fc.integer({ min: -2, max: 2 }),
  })
  .map(({ x, y, width, height, slant }) => ({
    shape: "polygon" as const,
    points: [
      { x: um(x * 1000), y: um(y * 1000) },
      { x: um((x + width) * 1000), y: um(y * 1000 + slant) },
      { x: um((x + width) * 1000), y: um((y + height) * 1000) },
    ],
  }));

/** An outline that tapers, its slope so slight that it is within a micrometre of straight over a piece, or runs in waves. */
const arbitraryOutline = (length: number, width: number) =>
  fc.oneof(
    fc.tuple(fc.integer({ min: -3, max: 9 }), fc.integer({ min: 0, max: 4_000 })).map(([taper, inset]) => [
      { x: um(0), y: um(inset) },
      { x: um(length), y: um(Math.max(0, inset + taper)) },
      { x: um(length), y: um(width) },
      { x: um(0), y: um(width) },
    ]),
    fc
      .array(umBetween(0, 6_000), { minLength: 4, maxLength: 7 })
      .map((waves) => [
        ...waves.map((wave, index) => ({ x: um(Math.round((length * index) / (waves.length - 1))), y: wave })),
        { x: um(length), y: um(width) },
        { x: um(0), y: um(width) },
      ]),
  );

export const arbitrarySmallBoard: fc.Arbitrary<BoardFace> = fc
  .record({
    length: umBetween(70_000, 95_000),
    width: umBetween(27_000, 55_000),
    areas: fc.array(fc.oneof(arbitraryKnot, arbitraryRoundKnot), { maxLength: 3 }),
    taken: fc.option(fc.tuple(umBetween(0, 100_000), umBetween(0, 50_000), umBetween(0, 3_500)), { nil: null }),
    traced: fc.boolean(),
  })
  .chain(({ length, width, areas, taken, traced }) =>
    (traced ? arbitraryOutline(length, width) : fc.constant(null)).map((outline) =>
      boardOf("b1", length, width, {
        outline,
        keepClear: areas.map((area, index) => ({ id: `k${index + 1}`, kind: "knot", area })),
        spokenFor:
          taken === null
            ? []
            : [
                {
                  id: "other",
                  rect: { x: taken[0], y: taken[1], width: um(8_000), height: um(6_000) },
                  kerfs: { along: taken[2], across: taken[2] },
                },
              ],
      }),
    ),
  );

export const arbitraryWeights: fc.Arbitrary<Weights> = fc.record({
  match: fc.integer({ min: 0, max: 5 }),
  step: fc.integer({ min: 0, max: 5 }),
  symmetry: fc.integer({ min: 0, max: 5 }),
  clear: fc.integer({ min: 0, max: 5 }),
  rest: fc.integer({ min: 0, max: 5 }),
  stock: fc.integer({ min: 0, max: 5 }),
});
