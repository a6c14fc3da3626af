/** Faces whose wood moves, for tests: any layout of `arbitraryLayout`, with wood that is known on both of its boards. */
import fc from "fast-check";
import { type BoardWood, type FaceLayout, type MovementRequest, type Surround, umFromMm, type WoodMovement } from "@/lib/layout";
import { arbitraryLayout, umBetween } from "../arbitrary-layout";

export const cherry: WoodMovement = { kind: "coefficients", radial: 0.00126, tangential: 0.00248 };

export const arbitraryWoodMovement: fc.Arbitrary<WoodMovement> = fc.oneof(
  fc
    .tuple(fc.double({ min: 0.0008, max: 0.003, noNaN: true }), fc.double({ min: 1.05, max: 2.5, noNaN: true }))
    .map(([radial, times]) => ({ kind: "coefficients" as const, radial, tangential: radial * times })),
  fc
    .tuple(fc.double({ min: 2, max: 7, noNaN: true }), fc.double({ min: 1.05, max: 2, noNaN: true }))
    .map(([radial, times]) => ({ kind: "shrinkage" as const, radial, tangential: radial * times })),
);

const arbitraryMoisture = fc.double({ min: 5, max: 16, noNaN: true });

export const arbitraryWood: fc.Arbitrary<BoardWood> = fc.record({
  movement: arbitraryWoodMovement,
  ringAngle: fc.integer({ min: 0, max: 90 }),
  moisture: arbitraryMoisture,
});

export const arbitrarySurround: fc.Arbitrary<Surround> = fc.oneof(
  fc.record({
    kind: fc.constant("sameWood" as const),
    grain: fc.constantFrom("with" as const, "across" as const, "lengthwise" as const),
    moisture: fc.option(arbitraryMoisture, { nil: null }),
  }),
  fc.constant({ kind: "sheet" as const }),
  fc.constant({ kind: "none" as const }),
);

/** Everything known. Both boards of `arbitraryLayout` are "b1" and "b2". */
export const arbitraryRequest: fc.Arbitrary<MovementRequest> = fc
  .record({
    layout: arbitraryLayout,
    first: arbitraryWood,
    second: arbitraryWood,
    surround: arbitrarySurround,
    around: fc.option(umBetween(500, 5_000), { nil: null }),
    driest: fc.double({ min: 5, max: 9, noNaN: true }),
    more: fc.double({ min: 0, max: 7, noNaN: true }),
    leastGap: umBetween(0, 4_000),
  })
  .map(({ layout, first, second, surround, around, driest, more, leastGap }) => ({
    layout,
    woods: new Map([
      ["b1", first],
      ["b2", second],
    ]),
    surround,
    around,
    year: { driest, dampest: driest + more },
    leastGap,
    moistureLimit: 2,
  }));

/** One board of flat-sawn cherry at 8 %, in a place of 6 to 12 %, least gap 1.5 mm. */
export function cherryFace(layout: FaceLayout, change: Partial<MovementRequest> = {}): MovementRequest {
  return {
    layout,
    woods: new Map([["b1", { movement: cherry, ringAngle: 0, moisture: 8 }]]),
    surround: { kind: "none" },
    around: null,
    year: { driest: 6, dampest: 12 },
    leastGap: umFromMm(1.5),
    moistureLimit: 2,
    ...change,
  };
}
