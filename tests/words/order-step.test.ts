/** What the bench reads, from programs that the planner made. */
import { describe, expect, test } from "vitest";
import type { Order } from "@/lib/schemas/order";
import { orderSteps } from "@/lib/schemas/order-steps";
import { stepWords, styleOf } from "@/lib/words/order-step";
import { labelRanges } from "@/lib/words/part-name";
import { yieldRoles } from "@/lib/words/yield-role";
import { makeOrder } from "../support/make-order";

function lines({ snapshot }: Order): string[] {
  const steps = orderSteps(snapshot);
  return steps.map((step, i) => {
    const { verb, rest } = stepWords(step, styleOf(snapshot), steps[i - 1]);
    return `${verb} ${rest}`;
  });
}

describe("the steps of an order", () => {
  test("fetch, mark and test before any cut; clean up and rack after the last", async () => {
    const kinds = orderSteps((await makeOrder()).snapshot).map(({ kind }) => kind);
    expect(kinds.slice(0, 3)).toEqual(["fetch", "mark", "test-cut"]);
    expect(kinds.slice(-2)).toEqual(["clean-up", "rack"]);
    expect(new Set(kinds.slice(3, -2))).toEqual(new Set(["cut"]));
  });

  test("are numbered through all boards, each with an id of its own that fits its column", async () => {
    const { snapshot } = await makeOrder({ boards: 3 });
    const steps = orderSteps(snapshot);
    expect(steps.map(({ number }) => number)).toEqual(steps.map((_, i) => i + 1));
    expect(new Set(steps.map(({ id }) => id)).size).toBe(steps.length);
    for (const { id } of steps) expect(id.length).toBeLessThanOrEqual(40);
    expect(orderSteps(snapshot)).toEqual(steps);
    // The kerf is tested once, not on every board.
    expect(steps.filter(({ kind }) => kind === "test-cut")).toHaveLength(1);
    expect(steps.filter(({ kind }) => kind === "fetch")).toHaveLength(3);
  });

  test("name what comes off and what it comes from", async () => {
    const said = lines(await makeOrder());
    expect(said[0]).toBe("Fetch board B-041 from rack 2 left");
    expect(said).toContain("Test cut in scrap with Panel saw, thin blade");
    for (const front of [1, 2, 3, 4]) expect(said).toContain(`Crosscut front ${front} from strip A`);
    expect(said).toContain("Rip the lower edge off, strip A stays");
    expect(said).toContain("Crosscut the left end of strip A square");
    expect(said).toContain("Clean up fronts 1–4");
  });

  test("a clean-up tells what every edge loses and the finished size", async () => {
    const { snapshot } = await makeOrder();
    const step = orderSteps(snapshot).find(({ kind }) => kind === "clean-up");
    if (!step) throw new Error("no clean-up");
    const words = stepWords(step, styleOf(snapshot));
    expect(words.notes).toEqual(["0.2 off each end, 0.2 off each long edge"]);
    expect(words.gives).toEqual([{ word: "finished", label: null, size: "243.2 × 184.0" }]);
  });

  test("edges left from the saw need no clean-up", async () => {
    const { snapshot } = await makeOrder({ cleanUpMm: 0 });
    expect(orderSteps(snapshot).some(({ kind }) => kind === "clean-up")).toBe(false);
  });

  test("a cut measured over what falls off goes by a mark, the others by fence or stop", async () => {
    const { snapshot } = await makeOrder();
    for (const step of orderSteps(snapshot)) {
      if (step.kind !== "cut" || step.cut.kind === "true") continue;
      const { measure, cautions, verb } = stepWords(step, styleOf(snapshot));
      if (verb === "Shoot") continue;
      const far = step.cut.bladeSide === "far";
      expect(measure?.startsWith("Mark from")).toBe(far);
      expect(cautions.some((caution) => caution.includes("No fence or stop"))).toBe(far);
    }
  });

  test("a sliver thinner than a saw takes surely goes to the plane, with none of the saw's cautions", async () => {
    // Gap 3.0, kerf 2.4, clean-up 0.2 on either side: 0.2 is left between two fronts.
    const { snapshot } = await makeOrder();
    const slivers = orderSteps(snapshot).filter((step) => step.kind === "cut" && step.cut.setting === 200);
    expect(slivers).toHaveLength(3);
    for (const step of slivers) {
      const words = stepWords(step, styleOf(snapshot));
      expect(`${words.verb} ${words.rest}`).toBe("Shoot the sliver off the fresh left end of strip A");
      expect(words.setting).toBe(200);
      expect(words.cautions.join()).not.toMatch(/fence|guard|clamp/i);
    }
  });

  test("a wider sliver is sawn", async () => {
    const { snapshot } = await makeOrder({ gapMm: 5 });
    const said = lines(await makeOrder({ gapMm: 5 }));
    expect(orderSteps(snapshot).filter((step) => step.kind === "cut" && step.cut.setting === 2_200)).toHaveLength(3);
    expect(said.filter((line) => line.startsWith("Crosscut the sliver"))).toHaveLength(3);
    expect(said.filter((line) => line.startsWith("Shoot"))).toEqual([]);
  });

  test("say of each part what becomes of it, the wanted one first", async () => {
    const { snapshot } = await makeOrder();
    const cut = orderSteps(snapshot).find((step) => step.kind === "cut" && step.cut.yields.some(({ label }) => label === "2"));
    if (cut?.kind !== "cut") throw new Error("front 2 is not cut");
    expect(yieldRoles(cut.cut).map(({ role, name }) => [role, name])).toEqual([
      ["You get", "Front 2"],
      ["Stays in hand", "Strip A"],
    ]);
  });
});

test("labels that count up are drawn together", () => {
  expect(labelRanges(["1", "2", "3", "7", "9", "10"])).toBe("1–3, 7, 9–10");
  expect(labelRanges(["C1", "C2"])).toBe("C1, C2");
  expect(labelRanges([])).toBe("");
});
