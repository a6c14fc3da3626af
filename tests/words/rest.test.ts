/** What entries of the bench come to, in words, from orders that were frozen as real ones are. */
import { describe, expect, test } from "vitest";
import { umFromMm } from "@/lib/layout";
import type { AsCutEntry } from "@/lib/schemas/as-cut";
import type { OrderSnapshot } from "@/lib/schemas/order-snapshot";
import { orderSteps } from "@/lib/schemas/order-steps";
import { asCutWords } from "@/lib/words/as-cut";
import { styleOf } from "@/lib/words/order-step";
import { effectHeadline, restEffect } from "@/lib/words/rest-effect";
import { makeOrder, type OrderWanted } from "../support/make-order";

/** An order ticked up to the first part of that name, and what is found then. */
async function found(label: string, entries: (order: Found) => AsCutEntry[], change: Partial<OrderWanted> = {}) {
  const { snapshot } = await makeOrder({ kerfMm: 3.2, cleanUpMm: 0, ...change });
  const steps = orderSteps(snapshot);
  const at = steps.findIndex((step) => step.kind === "cut" && step.cut.yields.some((part) => part.label === label));
  const step = steps[at];
  const part = step?.kind === "cut" ? step.cut.yields.find((one) => one.label === label) : undefined;
  const order = { snapshot, stepId: step?.id ?? "", partId: part?.id ?? "", boardId: snapshot.boards[0]?.boardId ?? "" };
  const made = entries(order);
  const effect = restEffect({ snapshot, ticked: new Set(steps.slice(0, at + 1).map(({ id }) => id)), entries: made });
  return { said: made.map((entry) => asCutWords(entry, snapshot, styleOf(snapshot))), effect, steps, at };
}

interface Found {
  readonly snapshot: OrderSnapshot;
  readonly stepId: string;
  readonly partId: string;
  readonly boardId: string;
}

describe("a true kerf", () => {
  const wider = ({ stepId }: Found): AsCutEntry[] => [{ kind: "kerf", stepId, kerf: umFromMm(3.6), reach: "on" }];

  test("that takes more than the gaps leave: which fronts lie too close, what saves them, and which cuts must wait", async () => {
    const { said, effect, steps, at } = await found("1", wider);
    expect(said).toEqual([`Kerf 3.6 mm instead of 3.2 mm, from step ${at + 1} on`]);
    expect(effect.troubles).toEqual([
      "Front 2 is 0.4 mm short in length, at the left end; Fronts 2–4 lie 0.4 mm too close for the blade; sliding fronts 2–4 by up to 1.2 mm saves them.",
    ]);
    expect(effectHeadline(effect)).toBe("The rest does not fit as issued.");
    expect([...effect.waiting]).toEqual(steps.filter((step, i) => i > at && step.kind === "cut").map(({ id }) => id));
  });

  test("in inches", async () => {
    const { said } = await found("1", wider, { units: "inch" });
    expect(said[0]).toMatch(/^Kerf 5⁄32″ instead of 1⁄8″, from step \d+ on$/);
  });

  test("told by the test cut is that of every cut, and where it fits the settings change and nothing else", async () => {
    const { said, effect } = await found("1", () => [{ kind: "kerf", stepId: "test-cut", kerf: umFromMm(3), reach: "all" }]);
    expect(said).toEqual(["Kerf 3.0 mm instead of 3.2 mm, at every cut"]);
    expect(effect.troubles).toEqual([]);
    expect(effectHeadline(effect)).toBe("Everything still fits, with other settings.");
  });
});

describe("a true size", () => {
  const short =
    (edge: "bottom" | "right", mm: number) =>
    ({ boardId, partId }: Found): AsCutEntry[] => [{ kind: "size", boardId, partId, edge, by: umFromMm(mm) }];

  test("of a strip: all its fronts slide across together", async () => {
    const { said, effect } = await found("A", short("bottom", -0.6));
    expect(said[0]).toMatch(/^Strip A [\d.]+ mm wide instead of [\d.]+ mm, at its lower edge$/);
    expect(effect.troubles).toEqual([
      "Fronts 1–4 are 0.6 mm short across, at the lower edge; sliding fronts 1–4 0.6 mm up saves them.",
    ]);
  });

  test("of a front: it is cut from the strip again", async () => {
    const { said, effect } = await found("1", short("right", -0.6));
    expect(said).toEqual(["Front 1 242.6 mm long instead of 243.2 mm, at its right end"]);
    expect(effect.troubles).toEqual(["Front 1 is 0.6 mm short in length, at the right end; front 1 can be cut from strip A."]);
  });

  test("that belongs to an earlier cut is said to", async () => {
    const { effect } = await found("1", short("bottom", 0.6));
    expect(effect.faults).toEqual(["That edge was made by an earlier cut: enter the true size there."]);
    expect(effectHeadline(effect)).toBe("This cannot be so.");
  });
});

test("a spoiled front: where it is cut again, and what of it can still be used", async () => {
  const { said, effect } = await found("2", ({ boardId }) => [
    { kind: "spoiled", boardId, pieceId: "p2", usable: { from: "left", length: umFromMm(120) } },
  ]);
  expect(said).toEqual(["Front 2 is spoiled; 120.0 mm from its left end can be used"]);
  expect(effect.troubles).toEqual(["Front 2 is spoiled; front 2 can be cut from strip A."]);
});

test("nothing entered means nothing, and nothing waits", async () => {
  const { effect } = await found("2", () => []);
  expect(effect).toEqual({ faults: [], troubles: [], waiting: new Set() });
});
