/** The steps that patterns ask for beside the cuts, from a layout to words. */
import { describe, expect, test } from "vitest";
import { type Face, freshCutOut, freshLayout, freshWrap, type ResawnFace, um, umFromMm } from "@/lib/layout";
import { stepsAfterCutting, stepsBeforeCutting } from "@/lib/schemas/face-steps";
import { faceWorkSchema } from "@/lib/schemas/face-work";
import { faceWorkOf } from "@/lib/server/orders/face-work";
import { faceStepWords } from "@/lib/words/face-step";

const loss = { kerf: umFromMm(3), cleanUpBefore: um(0), cleanUpAfter: um(0) };
const mm = { unit: "mm" } as const;

function workOf(face: Face) {
  const work = faceWorkOf(freshLayout(face, { crosscut: loss, rip: loss, spacing: "tight" }));
  if (work === null) throw new Error("this pattern asks for nothing");
  return faceWorkSchema.parse(work);
}

function rail(): Face {
  const fresh = freshCutOut({
    grain: "horizontal",
    length: umFromMm(700),
    rows: 1,
    fronts: 2,
    rowHeight: umFromMm(90),
    strip: umFromMm(30),
    end: umFromMm(40),
    divider: umFromMm(20),
    gap: umFromMm(1.5),
    rails: "fromSaw",
  });
  if (!fresh.ok) throw new Error(fresh.reason);
  return fresh.face;
}

const notesOf = (face: Face) => stepsAfterCutting(workOf(face), 1).map((step) => ({ id: step.id, ...faceStepWords(step, mm) }));

describe("the steps beside the cuts", () => {
  test("a plain grid asks for none", () => {
    const face: Face = {
      pattern: "grid",
      columns: [umFromMm(200)],
      rows: [umFromMm(100)],
      columnGaps: [],
      rowGaps: [],
      grain: "horizontal",
    };
    expect(faceWorkOf(freshLayout(face, { crosscut: loss, rip: loss, spacing: "tight" }))).toBeNull();
  });

  test("a rail is marked across its cuts, glued back with every part's shift, and its fronts fitted", () => {
    expect(stepsBeforeCutting(workOf(rail()), 1).map(({ id }) => id)).toEqual(["face-1:gauge-lines"]);
    const [glue, fit] = notesOf(rail());
    expect(glue).toMatchObject({ id: "face-1:set-back-1", verb: "Glue", rest: "parts 2, 4, 6 between strips 1 and 7" });
    // Segment = opening (tight, fitting = gap): each of the four crosscuts takes 3 + 1.5 of the wood beside the 1.5 gap.
    // Parts move towards the middle, the anchor, by what the crosscuts between took: twice 3 mm.
    expect(glue?.notes.slice(0, 3)).toEqual([
      "part 2: its line 6.0 mm right of that of the strips",
      "part 4: its line meets that of the strips",
      "part 6: its line 6.0 mm left of that of the strips",
    ]);
    expect(fit).toMatchObject({ id: "face-1:fit-1", verb: "Fit", rest: "fronts 3, 5 to their openings" });
    expect(fit?.gives.map(({ label, size }) => [label, size])).toEqual([
      ["3", "297.0 × 87.0"],
      ["5", "297.0 × 87.0"],
    ]);
  });

  test("a run is bevelled at its mitres and not at its gaps", () => {
    const sides = [umFromMm(300), umFromMm(600), umFromMm(300)];
    const run = { sides, height: umFromMm(100), thickness: umFromMm(20), grain: "horizontal", closed: false } as const;
    const mitred = freshWrap({ ...run, corner: { kind: "mitre", turnDeg: 90, parting: "squareThenBevels" } });
    expect(notesOf(mitred).map(({ id, rest }) => [id, rest])).toEqual([
      ["face-1:bevel-1", "1 and 2, 45° from square"],
      ["face-1:bevel-2", "2 and 3, 45° from square"],
    ]);
    // Twenty millimetres thick, half a right angle at each end: 20 mm shorter inside at every mitre.
    expect(notesOf(mitred)[0]?.notes).toContain(
      "1 300.0 mm on the show face, 280.0 mm inside; 2 600.0 mm on the show face, 560.0 mm inside",
    );
    expect(notesOf(freshWrap({ ...run, corner: { kind: "gap", turnDeg: 90, gap: umFromMm(2) } }))).toEqual([]);
  });

  test("a resawn pair says how thick the blank has to be", () => {
    const pair: ResawnFace = {
      pattern: "resawn",
      grain: "horizontal",
      leaf: { width: umFromMm(300), height: umFromMm(150), thickness: umFromMm(8) },
      opens: "side",
      resaw: { kerf: umFromMm(1.5), planing: umFromMm(0.8) },
      leanDeg: null,
    };
    const [resaw] = notesOf(pair);
    // Two leaves of 8, four planed faces of 0.8, one kerf of 1.5.
    expect(resaw?.notes[0]).toBe("blank 20.7 mm thick, kerf 1.5 mm; both sawn faces show");
    expect(resaw?.cautions.length).toBeGreaterThan(0);
  });
});
