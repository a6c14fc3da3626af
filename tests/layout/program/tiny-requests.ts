/** Boards of a few micrometres, so that every position can be tried. */
import fc from "fast-check";
import { boardEdges, type CutRequest, type PlacedPiece } from "@/lib/layout/program/cut-request";
import type { CutMachines, Machine } from "@/lib/layout/program/machine";
import type { ShopLimits } from "@/lib/layout/program/program";
import { um } from "@/lib/layout/units/um";

const limits: ShopLimits = {
  shortestCrosscut: um(7),
  narrowestRip: um(3),
  shortestMachined: um(7),
  offcutLength: um(5),
  offcutWidth: um(3),
};

const size = fc.integer({ min: 1, max: 6 });
const spot = fc.record({ x: fc.nat(9), y: fc.nat(7), width: size, height: size });
type Spot = { readonly x: number; readonly y: number; readonly width: number; readonly height: number };

export const anywhere = (most: number) => fc.array(spot, { minLength: 1, maxLength: most });

/** Those of many that lie clear of the ones before, as tight as they come: among them are layouts that block. */
export const crowded = fc.array(spot, { minLength: 20, maxLength: 40 }).map((spots) => {
  const kept: Spot[] = [];
  for (const one of spots) if (kept.every((other) => isClear(one, other))) kept.push(one);
  return kept;
});

function isClear(a: Spot, b: Spot): boolean {
  return a.x + a.width <= b.x || b.x + b.width <= a.x || a.y + a.height <= b.y || b.y + b.height <= a.y;
}

const none = { left: um(0), right: um(0), top: um(0), bottom: um(0) };

function pieceOf(spot: Spot, index: number): PlacedPiece {
  const rect = { x: um(spot.x), y: um(spot.y), width: um(spot.width), height: um(spot.height) };
  return { pieceId: `p${index + 1}`, label: String(index + 1), cleanUp: none, rect };
}

/** `planed`: what is too thin for the saw, at most. */
export const tinyRequest = (spots: fc.Arbitrary<Spot[]>, budget: number, planed = 0): fc.Arbitrary<CutRequest> =>
  fc
    .record({
      pieces: spots,
      kerf: fc.constantFrom(0, 0, 0, 1, 2),
      spare: fc.nat(3),
      deep: fc.nat(1),
      thinnestSawn: fc.nat(planed),
    })
    .map(({ pieces, kerf, spare, deep, thinnestSawn }) => ({
      board: {
        length: um(Math.max(...pieces.map((one) => one.x + one.width)) + spare),
        width: um(Math.max(...pieces.map((one) => one.y + one.height)) + deep),
      },
      pieces: pieces.map(pieceOf),
      kerf: { rip: um(kerf), crosscut: um(kerf) },
      boardEdges: boardEdges(true, true),
      truingTakes: { longEdge: um(0), end: um(0) },
      limits,
      thinnestSawn: um(thinnestSawn),
      budget,
    }));

const least = fc.nat(3).map(um);
const most = fc.option(fc.integer({ min: 1, max: 7 }).map(um), { freq: 2 });
const often = fc.constantFrom(true, true, true, false);

const machine = (id: string): fc.Arbitrary<Machine> =>
  fc.record({
    id: fc.constant(id),
    name: fc.constant(id),
    kind: fc.constantFrom("table", "table", "track", "band", "hand"),
    kerf: fc.nat(2).map(um),
    cleanUp: fc.nat(2).map(um),
    limits: fc.record({
      rips: often,
      crosscuts: often,
      widestRip: most,
      longestCrosscut: most,
      shortest: least,
      narrowest: least,
    }),
  });

const machines: fc.Arbitrary<CutMachines> = fc.oneof(
  fc.record({ rip: machine("a"), crosscut: machine("b"), others: fc.tuple(machine("c"), machine("d")) }),
  machine("a").chain((one) => fc.record({ rip: fc.constant(one), crosscut: fc.constant(one), others: fc.tuple(machine("c")) })),
);

/** The same with saws of all kinds, and with some clean-up inside the pieces' places. */
export const withMachines = (requests: fc.Arbitrary<CutRequest>): fc.Arbitrary<CutRequest> =>
  fc
    .record({
      request: requests,
      machines,
      cleanUps: fc.array(fc.record({ left: fc.nat(1), right: fc.nat(1), top: fc.nat(1), bottom: fc.nat(1) }), {
        minLength: 3,
        maxLength: 3,
      }),
    })
    .map(({ request, machines, cleanUps }) => ({
      ...request,
      machines,
      kerf: { rip: machines.rip.kerf, crosscut: machines.crosscut.kerf },
      pieces: request.pieces.map((piece, i) => {
        const wanted = cleanUps[i] ?? none;
        const { x, y, width, height } = piece.rect;
        const along = width > wanted.left + wanted.right ? wanted : { left: 0, right: 0 };
        const across = height > wanted.top + wanted.bottom ? wanted : { top: 0, bottom: 0 };
        return {
          ...piece,
          cleanUp: { left: um(along.left), right: um(along.right), top: um(across.top), bottom: um(across.bottom) },
          rect: {
            x: um(x + along.left),
            y: um(y + across.top),
            width: um(width - along.left - along.right),
            height: um(height - across.top - across.bottom),
          },
        };
      }),
    }));
