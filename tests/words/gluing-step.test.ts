/** What the bench reads before there is a blank to cut: which boards, which edge to which, what comes off, and the cautions. */
import { describe, expect, test } from "vitest";
import { umFromMm } from "@/lib/layout";
import type { Gluing, GluingMember } from "@/lib/schemas/gluing";
import { orderSnapshotSchema } from "@/lib/schemas/order-snapshot";
import { orderSteps, takesWood } from "@/lib/schemas/order-steps";
import { stepWords, styleOf } from "@/lib/words/order-step";
import { makeOrder } from "../support/make-order";

const member = (tag: string, topMm: number, heightMm: number, more: Partial<GluingMember> = {}): GluingMember => ({
  boardId: "0190a0a0-0000-7000-8000-00000000000a",
  tag,
  species: "black walnut",
  place: "rack 2 left",
  thickness: umFromMm(26),
  length: umFromMm(2350),
  width: umFromMm(80),
  straighteningId: "0190a0a0-0000-7000-8000-00000000000b",
  side: "face",
  endForEnd: false,
  rect: { x: umFromMm(0), y: umFromMm(topMm), width: umFromMm(2350), height: umFromMm(heightMm) },
  takes: { upper: umFromMm(1.5), lower: umFromMm(1.5) },
  ...more,
});

const gluing: Gluing = {
  jointing: umFromMm(1.5),
  members: [
    member("B-007", 0, 70, { takes: { upper: umFromMm(6), lower: umFromMm(13.5) } }),
    member("B-012", 70, 70, {
      endForEnd: true,
      rect: { x: umFromMm(12), y: umFromMm(70), width: umFromMm(2338), height: umFromMm(70) },
    }),
    member("B-009", 140, 70, { side: "back", place: "" }),
  ],
};

async function steps(change: Parameters<typeof makeOrder>[0] = {}) {
  const { snapshot } = await makeOrder({ gluing, glueLines: [umFromMm(70), umFromMm(140)], ...change });
  return { snapshot, steps: orderSteps(snapshot), style: styleOf(snapshot) };
}

describe("the steps that glue up a blank", () => {
  test("fetch every board, lay them out, trim outer edges, joint and glue, before the blank is marked and cut", async () => {
    const { steps: all, style } = await steps();
    const said = all.map((step) => {
      const { verb, rest } = stepWords(step, style);
      return `${verb} ${rest}`;
    });
    expect(said.slice(0, 10)).toEqual([
      "Fetch board B-007 from rack 2 left",
      "Fetch board B-012 from rack 2 left",
      "Fetch board B-009",
      "Lay out the boards of blank B-041",
      "Trim the upper edge of B-007",
      "Trim the lower edge of B-009",
      "Joint the lower edge of B-007 and the upper edge of B-012",
      "Joint the lower edge of B-012 and the upper edge of B-009",
      "Glue up blank B-041 of B-007, B-012 and B-009",
      "Mark board B-041",
    ]);
  });

  test("tell how the boards lie: order, turned or not, which side up, how far in", async () => {
    const { steps: all, style } = await steps();
    const arrange = all.find(({ kind }) => kind === "arrange");
    if (!arrange) throw new Error("no such step");
    expect(stepWords(arrange, style).notes).toEqual([
      "from the upper edge down: B-007, B-012 (turned end for end), B-009 (back up)",
      "the others face up",
      "left ends: B-007 at the left end, B-012 12.0 mm in, B-009 at the left end",
      "chalk a triangle across all boards: it tells which edge meets which",
    ]);
  });

  test("tell what each edge of a joint loses, what of it the saw takes, and how wide a board is then", async () => {
    const { steps: all, style } = await steps();
    const [first, second] = all.filter(({ kind }) => kind === "joint");
    if (!first || !second) throw new Error("no joints");
    expect(stepWords(first, style)).toMatchObject({
      notes: [
        "joint 1, edges as the boards lie",
        "13.5 mm off the lower edge of B-007, of it 12.0 mm with the saw",
        "1.5 mm off the upper edge of B-012",
        "straight and square, so that they close without force",
      ],
      gives: [{ word: "", label: "B-007", size: "2350.0 × 70.0" }],
    });
    // After the last joint both boards have all their edges.
    expect(stepWords(second, style).gives.map(({ label }) => label)).toEqual(["B-012", "B-009"]);
  });

  test("carry the cautions for jointer, glue and clamps, and say that the glue's maker knows best", async () => {
    const { steps: all, style } = await steps();
    const cautions = all.flatMap((step) => stepWords(step, style).cautions);
    for (const words of [/bridge guard/, /push blocks/, /Glue by its maker's instructions/, /Clamps/]) {
      expect(cautions.some((caution) => words.test(caution))).toBe(true);
    }
  });

  test("in inches, in fractions of the shop", async () => {
    const { steps: all, style } = await steps({ units: "inch" });
    const trim = all.find(({ kind }) => kind === "trim-edge");
    expect(trim && stepWords(trim, style).setting).toBe(6_000);
    const [joint] = all.filter(({ kind }) => kind === "joint");
    expect(joint && stepWords(joint, style).notes[1]).toMatch(/^17⁄32″ off the lower edge of B-007, of it 15⁄32″ with the saw$/);
  });

  test("take no wood of the picture that the order cuts from; cutting does", async () => {
    const { steps: all } = await steps();
    const before = all.slice(0, all.findIndex(({ kind }) => kind === "mark") + 1);
    expect(before.length).toBeGreaterThan(8);
    for (const { id } of before) expect(takesWood(id, "B-041")).toBe(false);
    for (const { id } of all.filter(({ kind }) => kind === "cut")) expect(takesWood(id, "B-041")).toBe(true);
  });

  test("have ids of their own that fit their column, the same every time", async () => {
    const { steps: all, snapshot } = await steps();
    expect(new Set(all.map(({ id }) => id)).size).toBe(all.length);
    for (const { id } of all) expect(id.length).toBeLessThanOrEqual(40);
    expect(orderSteps(snapshot).map(({ id }) => id)).toEqual(all.map(({ id }) => id));
  });
});

describe("a frozen order", () => {
  test("without any of this reads as before: face up, in one piece, nothing to glue", async () => {
    const { snapshot } = await makeOrder();
    expect(JSON.stringify(snapshot)).not.toMatch(/glueLines|gluing|"side"/);
    const read = orderSnapshotSchema.parse(JSON.parse(JSON.stringify(snapshot)));
    expect(read).toEqual(snapshot);
    expect(orderSteps(read)[0]?.kind).toBe("fetch");
  });

  test("on the back of a board says to turn it over", async () => {
    const { snapshot } = await makeOrder({ side: "back" });
    const mark = orderSteps(snapshot).find(({ kind }) => kind === "mark");
    expect(mark && stepWords(mark, styleOf(snapshot)).notes[0]).toMatch(
      /^Back up as in the picture: turn the board over about its long edge/,
    );
  });
});
