/**
 * Random layouts and boards for property tests: anything `layoutFaults` accepts, loose and swapped pieces and all turns
 * included.
 */
import fc from "fast-check";
import {
  type AnchorX,
  type AnchorY,
  type BoardFace,
  type CutLoss,
  changeAnchor,
  type FaceLayout,
  freshLayout,
  type Grain,
  type GridFace,
  type KeepClear,
  type LayoutChange,
  letLoose,
  moveGroup,
  pieceIdsOf,
  placeGroup,
  type QuarterTurns,
  type Spacing,
  swapPieces,
  turnGroup,
  turnsAlongGrain,
  um,
} from "@/lib/layout";

/** The layout of a change that must succeed. */
export function accepted(change: LayoutChange): FaceLayout {
  if (!change.ok) throw new Error(`refused: ${JSON.stringify(change.refusal)}`);
  return change.layout;
}

export const umBetween = (min: number, max: number) => fc.integer({ min, max }).map(um);

export const arbitraryCut: fc.Arbitrary<CutLoss> = fc.record({
  kerf: umBetween(0, 4_000),
  cleanUpBefore: umBetween(0, 1_500),
  cleanUpAfter: umBetween(0, 1_500),
});

export const arbitraryGrain = fc.constantFrom<Grain>("horizontal", "vertical");
export const arbitrarySpacing = fc.constantFrom<Spacing>("followGap", "tight");

/** Faces of up to four by four fronts; sizes come from a short list so that equal fronts to swap are common. */
export const arbitraryFace: fc.Arbitrary<GridFace> = fc
  .tuple(fc.integer({ min: 1, max: 4 }), fc.integer({ min: 1, max: 4 }), arbitraryGrain)
  .chain(([columns, rows, grain]) => {
    const size = fc.constantFrom(120_000, 120_001, 233_333, 90_007).map(um);
    const sizes = (count: number) => fc.array(size, { minLength: count, maxLength: count });
    const gaps = (count: number) => fc.array(umBetween(0, 6_000), { minLength: count - 1, maxLength: count - 1 });
    return fc.record({
      pattern: fc.constant("grid" as const),
      columns: sizes(columns),
      rows: sizes(rows),
      columnGaps: gaps(columns),
      rowGaps: gaps(rows),
      grain: fc.constant(grain),
    });
  });

const arbitraryTurns = fc.constantFrom<QuarterTurns>(0, 1, 2, 3);

export function arbitraryAnchors(layout: FaceLayout): fc.Arbitrary<readonly [AnchorX, AnchorY]> {
  const piece = fc.constantFrom(...pieceIdsOf(layout.face)).map((id) => ({ piece: id }));
  return fc.tuple(
    fc.oneof(fc.constantFrom<AnchorX>("left", "centre", "right"), piece),
    fc.oneof(fc.constantFrom<AnchorY>("top", "centre", "bottom"), piece),
  );
}

/** A set on board "b1", not disturbed: no loose pieces, no swaps. */
export const arbitrarySet: fc.Arbitrary<FaceLayout> = fc
  .tuple(
    arbitraryFace,
    arbitraryCut,
    arbitraryCut,
    arbitrarySpacing,
    fc.boolean(),
    umBetween(-50_000, 500_000),
    umBetween(-50_000, 500_000),
  )
  .chain(([face, crosscut, rip, spacing, turned, x, y]) => {
    const turns = turnsAlongGrain(face.grain)[turned ? 1 : 0];
    const placed = accepted(placeGroup(freshLayout(face, { crosscut, rip, spacing }), "set", "b1", { x, y }, turns));
    return arbitraryAnchors(placed).map(([anchorX, anchorY]) => accepted(changeAnchor(placed, anchorX, anchorY)));
  });

/** A layout after some pieces were let loose, slid, put on another board or turned any way, and some have changed places. */
export const arbitraryLayout: fc.Arbitrary<FaceLayout> = arbitrarySet.chain((set) => {
  const id = fc.constantFrom(...pieceIdsOf(set.face));
  const loosening = fc.tuple(
    id,
    umBetween(-300_000, 300_000),
    umBetween(-300_000, 300_000),
    fc.constantFrom("b1", "b2"),
    arbitraryTurns,
  );
  return fc.tuple(fc.array(loosening, { maxLength: 3 }), fc.array(fc.tuple(id, id), { maxLength: 3 })).map(([loose, swaps]) => {
    let layout = set;
    for (const [piece, x, y, stockId, turns] of loose) {
      const change = letLoose(layout, piece);
      if (!change.ok) continue;
      const group = change.layout.groups.at(-1);
      if (group === undefined) continue;
      layout =
        stockId === "b1"
          ? accepted(moveGroup(turns < 2 ? change.layout : accepted(turnGroup(change.layout, group.id)), group.id, { x, y }))
          : accepted(placeGroup(change.layout, group.id, stockId, { x, y }, turns));
    }
    for (const [p, q] of swaps) {
      const change = swapPieces(layout, p, q);
      if (change.ok) layout = change.layout;
    }
    return layout;
  });
});

export const arbitraryKeepClear: fc.Arbitrary<KeepClear["area"]> = fc.oneof(
  fc.record({
    shape: fc.constant("ellipse" as const),
    centre: fc.record({ x: umBetween(0, 1_000_000), y: umBetween(0, 400_000) }),
    radiusX: umBetween(2_000, 60_000),
    radiusY: umBetween(2_000, 60_000),
    turnDeg: fc.integer({ min: -180, max: 180 }),
  }),
  fc
    .record({
      centre: fc.record({ x: umBetween(0, 1_000_000), y: umBetween(0, 400_000) }),
      radii: fc.array(umBetween(1_000, 80_000), { minLength: 3, maxLength: 8 }),
    })
    .map(({ centre, radii }) => ({ shape: "polygon" as const, points: starPolygon(centre, radii) })),
);

/** A simple polygon, often concave: corners at these distances round a middle. */
export function starPolygon(centre: { readonly x: number; readonly y: number }, radii: readonly number[]) {
  return radii.map((radius, index) => {
    const turn = (2 * Math.PI * index) / radii.length;
    return { x: um(Math.round(centre.x + radius * Math.cos(turn))), y: um(Math.round(centre.y + radius * Math.sin(turn))) };
  });
}

export function boardOf(id: string, length: number, width: number, more: Partial<BoardFace> = {}): BoardFace {
  return {
    id,
    length: um(length),
    width: um(width),
    thickness: um(27_000),
    outline: null,
    keepClear: [],
    spokenFor: [],
    glueLines: [],
    ...more,
  };
}

/** Long and wide beside what `arbitraryLayout` makes, with a few knots among it: sliding usually helps. */
export const arbitraryRoomyBoard = (id: string): fc.Arbitrary<BoardFace> =>
  fc
    .record({
      length: umBetween(2_000_000, 3_000_000),
      width: umBetween(900_000, 1_500_000),
      areas: fc.array(arbitraryKeepClear, { minLength: 1, maxLength: 3 }),
    })
    .map(({ length, width, areas }) =>
      boardOf(id, length, width, { keepClear: areas.map((area, index) => ({ id: `k${index + 1}`, kind: "stain", area })) }),
    );

export const arbitraryBoard = (id: string): fc.Arbitrary<BoardFace> =>
  fc
    .record({
      length: umBetween(400_000, 1_200_000),
      width: umBetween(120_000, 500_000),
      outline: fc.option(fc.array(umBetween(150_000, 500_000), { minLength: 5, maxLength: 12 }), { nil: null }),
      areas: fc.array(arbitraryKeepClear, { maxLength: 6 }),
    })
    .map(({ length, width, outline, areas }) =>
      boardOf(id, length, width, {
        outline: outline === null ? null : starPolygon({ x: length / 2, y: width / 2 }, outline),
        keepClear: areas.map((area, index) => ({ id: `k${index + 1}`, kind: "knot", area })),
      }),
    );
