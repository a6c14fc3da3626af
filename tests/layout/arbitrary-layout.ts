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
  type CutOutFace,
  type CutOutPart,
  changeAnchor,
  type Face,
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
  type ResawnFace,
  type Spacing,
  swapPieces,
  turnGroup,
  turnsAlongGrain,
  um,
  type WrapCorner,
  type WrapFace,
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

/** Grids of up to four by four fronts; sizes come from a short list so that equal fronts to swap are common. */
export const arbitraryGridFace: fc.Arbitrary<GridFace> = fc
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

/** Rails of up to two rows with up to three fronts each, some of them without a divider between. */
export const arbitraryCutOutFace: fc.Arbitrary<CutOutFace> = fc
  .record({
    grain: arbitraryGrain,
    rows: fc.array(
      fc.record({
        height: fc.constantFrom(60_000, 75_001).map(um),
        end: fc.constantFrom(30_000, 41_003).map(um),
        fronts: fc.array(
          fc.record({ width: fc.constantFrom(90_000, 90_001, 133_333).map(um), after: fc.constantFrom(0, 22_000, 22_001) }),
          { minLength: 1, maxLength: 3 },
        ),
      }),
      { minLength: 1, maxLength: 2 },
    ),
    strips: fc.array(fc.constantFrom(25_000, 40_001).map(um), { minLength: 3, maxLength: 3 }),
    gap: fc.record({
      left: umBetween(0, 4_000),
      right: umBetween(0, 4_000),
      top: umBetween(0, 4_000),
      bottom: umBetween(0, 4_000),
    }),
    fitting: umBetween(0, 3_000),
    rails: fc.constantFrom("jointed" as const, "fromSaw" as const),
  })
  .map(({ rows, strips, ...face }) => {
    const parts = rows.map(({ end, fronts }) => [
      { kind: "fixed" as const, width: end },
      ...fronts.flatMap(({ width, after }, index): CutOutPart[] => {
        const divided = after > 0 && index + 1 < fronts.length;
        return [{ kind: "front", width }, ...(divided ? [{ kind: "fixed" as const, width: um(after) }] : [])];
      }),
    ]);
    const lengths = parts.map((row) => row.reduce((sum, { width }) => sum + width, 0));
    const longest = Math.max(...lengths) + 35_000;
    return {
      pattern: "cutOut",
      ...face,
      strips: strips.slice(0, rows.length + 1),
      rows: rows.map(({ height }, row) => {
        const end: CutOutPart = { kind: "fixed", width: um(longest - (lengths[row] ?? 0)) };
        return { height, parts: [...(parts[row] ?? []), end] };
      }),
    };
  });

const arbitraryTurn = fc.constantFrom(90, 90, 60, 45, 120, 30.5);

export const arbitraryCorner: fc.Arbitrary<WrapCorner> = fc.oneof(
  fc.record({ kind: fc.constant("gap" as const), turnDeg: arbitraryTurn, gap: umBetween(0, 6_000) }),
  fc.record({ kind: fc.constant("butt" as const), turnDeg: arbitraryTurn, covers: fc.constantFrom("before" as const, "after") }),
  fc.record({
    kind: fc.constant("mitre" as const),
    turnDeg: arbitraryTurn,
    parting: fc.constantFrom("squareThenBevels" as const, "oneBevel"),
  }),
);

/** Runs of up to four sides, open or closed; a closed one need not come back to its start. */
export const arbitraryWrapFace: fc.Arbitrary<WrapFace> = fc
  .record({
    grain: arbitraryGrain,
    sides: fc.array(fc.constantFrom(120_000, 120_001, 96_007).map(um), { minLength: 1, maxLength: 4 }),
    corners: fc.array(arbitraryCorner, { minLength: 4, maxLength: 4 }),
    height: fc.constantFrom(70_000, 110_001).map(um),
    thickness: fc.constantFrom(12_000, 24_500).map(um),
    closed: fc.boolean(),
  })
  .map(({ corners, closed, ...face }) => {
    const closes = closed && face.sides.length > 2;
    return { pattern: "wrap", ...face, corners: corners.slice(0, face.sides.length - (closes ? 0 : 1)), closed: closes };
  });

export const arbitraryResawnFace: fc.Arbitrary<ResawnFace> = fc.record({
  pattern: fc.constant("resawn" as const),
  grain: arbitraryGrain,
  leaf: fc.record({
    width: fc.constantFrom(150_000, 150_001).map(um),
    height: fc.constantFrom(120_000, 233_333).map(um),
    thickness: umBetween(4_000, 20_000),
  }),
  opens: fc.constantFrom("side" as const, "over" as const),
  resaw: fc.record({ kerf: umBetween(0, 3_000), planing: umBetween(0, 2_000) }),
  leanDeg: fc.option(fc.double({ min: -70, max: 70, noNaN: true }), { nil: null }),
});

/** The patterns whose pieces show the face of the board that was photographed. */
export const arbitraryOuterFace: fc.Arbitrary<Face> = fc.oneof(arbitraryGridFace, arbitraryCutOutFace, arbitraryWrapFace);

/** Every pattern. */
export const arbitraryFace: fc.Arbitrary<Face> = fc.oneof(
  arbitraryGridFace,
  arbitraryCutOutFace,
  arbitraryWrapFace,
  arbitraryResawnFace,
);

const arbitraryTurns = fc.constantFrom<QuarterTurns>(0, 1, 2, 3);

export function arbitraryAnchors(layout: FaceLayout): fc.Arbitrary<readonly [AnchorX, AnchorY]> {
  const piece = fc.constantFrom(...pieceIdsOf(layout.face)).map((id) => ({ piece: id }));
  return fc.tuple(
    fc.oneof(fc.constantFrom<AnchorX>("left", "centre", "right"), piece),
    fc.oneof(fc.constantFrom<AnchorY>("top", "centre", "bottom"), piece),
  );
}

/** A set on board "b1", not disturbed: no loose pieces, no swaps. */
export const arbitrarySetOf = <F extends Face>(faces: fc.Arbitrary<F>): fc.Arbitrary<FaceLayout & { readonly face: F }> =>
  fc
    .tuple(
      faces,
      arbitraryCut,
      arbitraryCut,
      arbitrarySpacing,
      fc.boolean(),
      umBetween(-50_000, 500_000),
      umBetween(-50_000, 500_000),
    )
    .chain(([face, crosscut, rip, spacing, turned, x, y]) => {
      const turns = turnsAlongGrain(face.grain)[turned ? 1 : 0];
      const fresh = freshLayout(face, { crosscut, rip, spacing });
      return arbitraryAnchors(fresh).map(([anchorX, anchorY]) => {
        const anchored = accepted(changeAnchor(fresh, anchorX, anchorY));
        return { ...accepted(placeGroup(anchored, "set", "b1", { x, y }, turns)), face };
      });
    });

export const arbitrarySet: fc.Arbitrary<FaceLayout> = arbitrarySetOf(arbitraryFace);

/** A layout after some pieces were let loose, slid, put on another board or turned any way, and some have changed places. */
export const arbitraryLayoutOf = <F extends Face>(faces: fc.Arbitrary<F>) =>
  arbitrarySetOf(faces).chain((set) => disturbed(set).map((layout) => ({ ...layout, face: set.face })));

export const arbitraryLayout: fc.Arbitrary<FaceLayout> = arbitrarySet.chain(disturbed);

function disturbed(set: FaceLayout): fc.Arbitrary<FaceLayout> {
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
}

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
    // Thick enough for any face of these.
    thickness: um(60_000),
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
