/** Small boards with rows of fronts, more or less tight, of which some steps are done, with random things found at the bench. */
import fc from "fast-check";
import { boardEdges, type CutRequest, type PlacedPiece } from "@/lib/layout/program/cut-request";
import { planCuts } from "@/lib/layout/program/plan-cuts";
import type { CutProgram } from "@/lib/layout/program/program";
import type { AsCutEntry } from "@/lib/layout/replan/as-cut";
import type { RestRequest } from "@/lib/layout/replan/part-in-hand";
import { um } from "@/lib/layout/units/um";
import { limits } from "../program/row-of-fronts";
import { restRequest } from "./at-the-bench";

export interface Bench {
  readonly asked: CutRequest;
  readonly request: RestRequest;
}

const room = fc.constantFrom(0, 0, 0, 300, 900, 12_000);
const cleanUp = fc.constantFrom(0, 0, 200, 500);
const kerf = fc.constantFrom(1_800, 2_400, 3_200);

interface DrawnFront {
  readonly width: number;
  readonly low: number;
  readonly before: number;
  readonly cleanUp: number;
}

const rowOfFronts = fc.record({
  height: fc.integer({ min: 60_000, max: 90_000 }),
  before: room,
  fronts: fc.array(
    fc.record({ width: fc.integer({ min: 80_000, max: 160_000 }), low: fc.constantFrom(0, 0, 4_000), before: room, cleanUp }),
    { minLength: 1, maxLength: 3 },
  ),
});

interface Found {
  readonly kind: number;
  readonly at: number;
  readonly by: number;
}

interface Drawn {
  readonly rows: readonly { readonly height: number; readonly before: number; readonly fronts: readonly DrawnFront[] }[];
  readonly rip: number;
  readonly crosscut: number;
  readonly end: number;
  readonly below: number;
  readonly rough: boolean;
  readonly share: number;
  readonly found: readonly Found[];
}

const drawn: fc.Arbitrary<Drawn> = fc.record({
  rows: fc.array(rowOfFronts, { minLength: 1, maxLength: 2 }),
  rip: kerf,
  crosscut: kerf,
  end: fc.constantFrom(0, 700, 30_000, 200_000),
  below: fc.constantFrom(0, 700, 30_000),
  rough: fc.boolean(),
  share: fc.integer({ min: 0, max: 100 }),
  found: fc.array(fc.record({ kind: fc.nat(5), at: fc.nat(999), by: fc.integer({ min: -2_500, max: 1_500 }) }), { maxLength: 4 }),
});

/** Rows one below the other, fronts one beside the other, each with the blade and some room before it. Planned in haste. */
function requestOf({ rows, rip, crosscut, end, below, rough }: Drawn): CutRequest {
  const pieces: PlacedPiece[] = [];
  let y = 0;
  let length = 0;
  for (const row of rows) {
    y += y === 0 ? row.before : row.before + rip;
    let x = 0;
    for (const one of row.fronts) {
      x += (x === 0 ? 0 : crosscut) + one.before + one.cleanUp;
      const amount = um(one.cleanUp);
      pieces.push({
        pieceId: `p${pieces.length + 1}`,
        label: String(pieces.length + 1),
        rect: { x: um(x), y: um(y + one.cleanUp), width: um(one.width), height: um(row.height - one.low - 2 * one.cleanUp) },
        cleanUp: { left: amount, right: amount, top: amount, bottom: amount },
      });
      x += one.width + one.cleanUp;
    }
    length = Math.max(length, x);
    y += row.height;
  }
  return {
    board: { length: um(length + end), width: um(y + below) },
    pieces,
    kerf: { rip: um(rip), crosscut: um(crosscut) },
    boardEdges: boardEdges(!rough, true),
    truingTakes: { longEdge: um(0), end: um(0) },
    limits,
    budget: 0,
  };
}

const sawable = drawn.map((one) => ({ ...one, asked: requestOf(one) })).filter(({ asked }) => planCuts(asked).ok);

function benchOf(
  { asked, share }: Drawn & { readonly asked: CutRequest },
  entries: (program: CutProgram) => readonly AsCutEntry[],
): Bench {
  const request = restRequest(asked, { done: 0, entries });
  const { steps } = request.program;
  const done = new Set(steps.slice(0, Math.round((steps.length * share) / 100)).map(({ number }) => number));
  return { asked, request: { ...request, done } };
}

/** Steps done from the first on; entries of every kind, some of them wrong. */
export const anyBench: fc.Arbitrary<Bench> = sawable.map((one) =>
  benchOf(one, (program) => one.found.flatMap((found) => entryOf(found, program))),
);

/** The same with nothing found that is not as planned. */
export const benchAsPlanned: fc.Arbitrary<Bench> = sawable.map((one) =>
  benchOf(one, (program) =>
    one.found.flatMap((found) => asPlanned(entryOf({ ...found, kind: found.kind % 4 }, program), program)),
  ),
);

function entryOf({ kind, at, by }: Found, program: CutProgram): AsCutEntry[] {
  const step = program.steps[at % program.steps.length];
  if (!step) return [];
  const part = step.yields[at % Math.max(1, step.yields.length)];
  const piece = program.pieces[at % Math.max(1, program.pieces.length)];
  if (kind === 0 || kind === 1) {
    if (step.kind !== "rip" && step.kind !== "crosscut") return [];
    const reach = (["all", "on", "only"] as const)[at % 3] ?? "all";
    return [{ kind: "kerf", step: step.number, kerf: um(Math.max(0, program.kerf[step.kind] + Math.round(by / 4))), reach }];
  }
  if (kind < 4) {
    if (!part) return [];
    const edge = (["left", "right", "top", "bottom"] as const)[(at >> 2) % 4] ?? "left";
    return [{ kind: "size", partId: part.id, edge, by: um(kind === 2 ? by : Math.min(by, 0)) }];
  }
  if (!piece?.pieceId) return [];
  const usable = at % 3 === 0 ? { from: "left" as const, length: um(Math.floor(piece.rect.width / 2)) } : null;
  return [{ kind: "spoiled", pieceId: piece.pieceId, usable }];
}

function asPlanned(entries: readonly AsCutEntry[], program: CutProgram): AsCutEntry[] {
  return entries.flatMap((entry): AsCutEntry[] => {
    if (entry.kind === "size") return [{ ...entry, by: um(0) }];
    const step = entry.kind === "kerf" && program.steps.find(({ number }) => number === entry.step);
    if (!step || (step.kind !== "rip" && step.kind !== "crosscut") || entry.kind !== "kerf") return [];
    // One saw makes both kinds of cut, yet a random board may give them blades of their own.
    return program.kerf.rip === program.kerf.crosscut ? [{ ...entry, kerf: program.kerf[step.kind] }] : [];
  });
}
