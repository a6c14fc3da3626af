import { describe, expect, test } from "vitest";
import { planRest } from "@/lib/layout/replan/plan-rest";
import { verifyRest } from "@/lib/layout/replan/verify-rest";
import { um, umFromMm } from "@/lib/layout/units/um";
import { front, request, row } from "../program/row-of-fronts";
import { issuedAgain, partOf, planned, programOf, restRequest, stepThatMakes } from "./at-the-bench";

/** Four fronts in a row that leave room for nothing but the blade, with wood to spare to the right of them. */
const tight = request(2350, 230, row(4, 96, 14, 243.2, 184, 2.4));

const slides = (plan: ReturnType<typeof planned>) =>
  plan.assessment.troubles.flatMap(({ rescues, chosen }) =>
    (rescues.find(({ kind }) => kind === chosen)?.changes ?? []).map(({ label, by }) => [label, by.x, by.y]),
  );

describe("with nothing entered", () => {
  test("the steps left are the steps left, to the letter", () => {
    const program = programOf(tight);
    for (let done = 0; done <= program.steps.length; done++) {
      const plan = planned(tight, { done });
      expect(plan.program.steps).toEqual(program.steps);
      expect(plan.program.conservation).toEqual(program.conservation);
      expect(plan.changed).toBe(false);
    }
  });

  test("a ticked step tells that those before it were done though nobody ticked them", () => {
    const program = programOf(tight);
    const first = stepThatMakes(program, "1");
    const plan = planned(tight, { done: ({ number }) => number === first.number });
    expect(plan.done).toContain(first.number);
    expect(plan.assessment.implied).toEqual(plan.done.filter((number) => number !== first.number));
    expect(plan.assessment.implied.length).toBeGreaterThan(0);
  });
});

describe("a blade wider than planned", () => {
  const kerf =
    (mm: number, reach: "all" | "on" | "only" = "all") =>
    (program: ReturnType<typeof programOf>) => [
      { kind: "kerf" as const, step: stepThatMakes(program, "1").number, kerf: umFromMm(mm), reach },
    ];
  const untilFirst = (asked = tight) => {
    const program = programOf(asked);
    return (
      program.steps.findIndex((step) => step === stepThatMakes(program, "1") || step.yields.some(({ label }) => label === "1")) +
      1
    );
  };

  test("pushes the fronts still to be cut away from the one that is cut, by what each cut took more", () => {
    const plan = planned(tight, { done: untilFirst(), entries: kerf(2.8) });
    expect(slides(plan)).toEqual([
      ["2", 400, 0],
      ["3", 800, 0],
      ["4", 1200, 0],
    ]);
    expect(plan.program.kerf.crosscut).toBe(2800);
    const one = programOf(tight).pieces.find(({ label }) => label === "1");
    expect(plan.program.pieces.find(({ label }) => label === "1")).toEqual(one);
  });

  test("moves nothing where the gaps leave room for it", () => {
    const loose = request(2350, 230, row(4, 96, 14, 243.2, 184, 3.2));
    const plan = planned(loose, { done: untilFirst(loose), entries: kerf(2.8) });
    expect(plan.assessment.troubles).toEqual([]);
    expect(plan.program.pieces.map(({ rect }) => rect)).toEqual(expect.arrayContaining(loose.pieces.map(({ rect }) => rect)));
  });

  test("at one cut alone leaves the others as planned", () => {
    const plan = planned(tight, { done: untilFirst(), entries: kerf(2.8, "only") });
    expect(plan.program.kerf.crosscut).toBe(2400);
    expect(slides(plan)).toEqual([
      ["2", 400, 0],
      ["3", 400, 0],
      ["4", 400, 0],
    ]);
    expect(plan.program.steps.filter(({ blade }) => blade === 2800)).toHaveLength(1);
  });

  test("is taken from the clean-up where there is no wood to slide into", () => {
    const short = request(
      4 * 243.2 + 3 * 2.8 + 0.4,
      184.4,
      [0, 1, 2, 3].map((i) => front(i + 1, 0.2 + i * 246, 0.2, 243.2, 184, 0.2)),
    );
    const plan = planned(short, { done: untilFirst(short), entries: kerf(2.6) });
    const [trouble] = plan.assessment.troubles;
    expect(trouble?.chosen).toBe("less-clean-up");
    const changes = trouble?.rescues.find(({ kind }) => kind === "less-clean-up")?.changes ?? [];
    expect(changes.every(({ smaller }) => smaller.along === 0 && smaller.across === 0)).toBe(true);
    const taken = changes.flatMap(({ cleanUp }) => cleanUp.map(({ planned: was, left }) => was - left));
    expect(taken.reduce((sum, by) => sum + by, 0)).toBe(600);
  });
});

describe("a part of another size than planned", () => {
  test("is made good by sliding across it where there is wood on the other side", () => {
    const program = programOf(tight);
    const [rip] = program.steps;
    const strip = rip?.yields.find(({ kind }) => kind === "strip");
    expect(strip?.rect.height).toBe(198_000);
    const plan = planned(tight, {
      done: 1,
      entries: () => [{ kind: "size", partId: strip?.id ?? "", edge: "bottom", by: umFromMm(-0.6) }],
    });
    const [trouble] = plan.assessment.troubles;
    expect(trouble?.facts).toContainEqual({ kind: "short", piece: { pieceId: "p4", label: "4" }, edge: "bottom", by: 600 });
    expect(trouble).toMatchObject({ chosen: "slide", missing: { along: 0, across: 0 } });
    expect(slides(plan)).toEqual(["1", "2", "3", "4"].map((label) => [label, 0, -600]));
  });

  test("says by how much a front no longer fits, leaves it a little smaller or cuts it elsewhere, and holds what is cut", () => {
    const program = programOf(tight);
    const cut = stepThatMakes(program, "2");
    const part = partOf(program, "2");
    const edge = cut.fromEdge === "left" ? ("right" as const) : ("left" as const);
    const plan = planned(tight, {
      done: ({ number }) => number <= cut.number,
      entries: () => [{ kind: "size", partId: part.id, edge, by: umFromMm(-0.6) }],
    });
    const [trouble] = plan.assessment.troubles;
    expect(trouble?.facts).toEqual([{ kind: "short", piece: { pieceId: "p2", label: "2" }, edge, by: 600 }]);
    expect(trouble?.missing).toEqual({ along: 600, across: 0 });
    expect(trouble?.rescues.map(({ kind }) => kind)).toEqual(["elsewhere", "smaller", "other-board"]);
    expect(trouble?.rescues.find(({ kind }) => kind === "smaller")?.changes).toMatchObject([
      { label: "2", smaller: { along: 600, across: 0 } },
    ]);
    const again = plan.program.pieces.find(({ label }) => label === "2");
    expect(again?.rect.width).toBe(243_200);
    expect(plan.program.waste.some(({ id }) => id === part.id)).toBe(true);
  });

  test("longer at its own cut gives the other side of the blade less", () => {
    const program = programOf(tight);
    const cut = stepThatMakes(program, "1");
    const part = partOf(program, "1");
    const edge = cut.fromEdge === "left" ? ("right" as const) : ("left" as const);
    const plan = planned(tight, {
      done: ({ number }) => number <= cut.number,
      entries: () => [{ kind: "size", partId: part.id, edge, by: umFromMm(0.3) }],
    });
    // Front 1 is trimmed to its length; what was left for the others is 0.3 mm less.
    expect(plan.program.pieces.find(({ label }) => label === "1")?.rect).toEqual(tight.pieces[0]?.rect);
    expect(slides(plan)).toEqual([
      ["2", 300, 0],
      ["3", 300, 0],
      ["4", 300, 0],
    ]);
  });

  test("cannot be longer at an edge that another cut made, nor longer than the wood", () => {
    const program = programOf(tight);
    const part = partOf(program, "1");
    const done = ({ number }: { number: number }) => number <= stepThatMakes(program, "1").number;
    const long = restRequest(tight, { done, entries: () => [{ kind: "size", partId: part.id, edge: "top", by: umFromMm(0.3) }] });
    expect(planRest(long, tight)).toMatchObject({ ok: false, reason: "entry", fault: "longer-at-earlier-cut" });
    const gone = restRequest(tight, {
      done,
      entries: () => [{ kind: "size", partId: part.id, edge: "top", by: umFromMm(-300) }],
    });
    expect(planRest(gone, tight)).toMatchObject({ ok: false, reason: "entry", fault: "more-than-there-is" });
  });
});

describe("a spoiled front", () => {
  test("is cut again from the strip in hand, as near as can be to where it lay", () => {
    const program = programOf(tight);
    const cut = stepThatMakes(program, "2");
    const plan = planned(tight, {
      done: ({ number }) => number <= cut.number,
      entries: () => [{ kind: "spoiled", pieceId: "p2", usable: null }],
    });
    const [trouble] = plan.assessment.troubles;
    expect(trouble).toMatchObject({ key: "piece p2", facts: [{ kind: "spoiled" }], chosen: "elsewhere" });
    const [four, two] = ["4", "2"].map((label) => plan.program.pieces.find((part) => part.label === label)?.rect);
    expect(two?.x).toBe((four?.x ?? 0) + (four?.width ?? 0) + 2400);
    expect(plan.program.waste.map(({ id }) => id)).toContain(partOf(program, "2").id);
  });

  test("needs another board where nothing in hand will do, and the rest is planned without it", () => {
    const full = request(4 * 243.2 + 3 * 2.4, 184, row(4, 0, 0, 243.2, 184, 2.4));
    const program = programOf(full);
    const cut = stepThatMakes(program, "2");
    const plan = planned(full, {
      done: ({ number }) => number <= cut.number,
      entries: () => [{ kind: "spoiled", pieceId: "p2", usable: null }],
    });
    expect(plan.assessment.troubles).toMatchObject([{ chosen: "other-board" }]);
    expect(plan.assessment.leftOut.map(({ label }) => label)).toEqual(["2"]);
    expect(plan.program.pieces.map(({ label }) => label).sort()).toEqual(["1", "3", "4"]);
  });

  test("leaves what is usable of it as an offcut, from which a smaller front is cut", () => {
    const pieces = [front(1, 0, 0, 600, 150), front(2, 602.4, 0, 250, 150)];
    const full = request(852.4, 150, pieces);
    const program = programOf(full);
    const all = program.steps.length;
    const plan = planned(full, {
      done: all,
      entries: () => [
        { kind: "spoiled", pieceId: "p1", usable: { from: "left", length: umFromMm(300) } },
        { kind: "spoiled", pieceId: "p2", usable: null },
      ],
    });
    expect(plan.assessment.leftOut.map(({ label }) => label)).toEqual(["1"]);
    const again = plan.program.pieces.find(({ label }) => label === "2")?.rect;
    expect((again?.x ?? 0) + (again?.width ?? 0)).toBeLessThanOrEqual(300_000);
  });

  test("that is not parted yet leaves a place on which no other may lie", () => {
    const plan = planned(tight, { done: 1, entries: () => [{ kind: "spoiled", pieceId: "p3", usable: null }] });
    const three = plan.program.pieces.find(({ label }) => label === "3")?.rect;
    const old = tight.pieces[2]?.rect;
    expect(three && old && (three.x >= old.x + old.width || three.x + three.width <= old.x)).toBe(true);
    expect(um(three?.width ?? 0)).toBe(243_200);
  });
});

describe("the revision after", () => {
  test("begins with the parts that lie there, and holds what the one before it found", () => {
    const first = programOf(tight);
    const cut = stepThatMakes(first, "1").number;
    const done = ({ number }: { number: number }) => number <= cut;
    const request = restRequest(tight, {
      done,
      entries: () => [{ kind: "kerf", step: cut, kerf: umFromMm(2.8), reach: "all" }],
    });
    const before = planRest(request, tight);
    if (!before.ok) throw new Error(before.reason);
    const next = { ...issuedAgain(request, before), done: new Set([8, 9]) };
    const plan = planRest({ ...next, entries: [{ kind: "spoiled", pieceId: "p2", usable: null }] }, tight);
    if (!plan.ok) throw new Error(plan.reason);
    expect(verifyRest(tight.board, plan)).toEqual({ ok: true });
    expect(plan.program.steps.slice(0, cut)).toEqual(before.program.steps.slice(0, cut));
    expect(plan.done).toEqual([1, 2, 3, 4, 8, 9]);
    const [one, three] = ["1", "3"].map((label) => plan.program.pieces.find((part) => part.label === label)?.rect);
    expect([one?.x, three?.x]).toEqual([96_000, 588_000]);
    expect(plan.assessment.troubles).toMatchObject([{ key: "piece p2", chosen: "elsewhere" }]);
  });
});
