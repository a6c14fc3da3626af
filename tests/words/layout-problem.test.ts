import { describe, expect, test } from "vitest";
import { type Problem, um } from "@/lib/layout";
import { heldBySentence, spokenForWords } from "@/lib/words/held-by";
import { problemSentence } from "@/lib/words/layout-problem";

const whose = { label: "1", faceTitle: "Left cabinet", jobTitle: "Pair of bedside cabinets" };
const onWood = (over: number, missing: number, slide: number | null): Problem => ({
  kind: "spoken-for",
  piece: "p2",
  spokenForId: "w1",
  over: um(over),
  missing: um(missing),
  slide: slide === null ? null : um(slide),
});

function sentence(problem: Problem, issued: boolean | null): string {
  const woodOf = () => (issued === null ? undefined : { ...whose, issued });
  return problemSentence(problem, { unit: "mm" }, { tagOf: () => "B-007", woodOf });
}

describe("a front on wood of another face", () => {
  test("how far it lies over, over what, and the slide that mends it", () => {
    expect(sentence(onWood(12_000, 15_000, -15_000), false)).toBe(
      "Front 2 lies 12.0 mm over front 1 of Left cabinet, Pair of bedside cabinets. Slide the set 15.0 mm left.",
    );
    expect(sentence(onWood(12_000, 15_000, 15_000), true)).toBe(
      "Front 2 lies 12.0 mm over front 1 of Left cabinet, Pair of bedside cabinets, which is issued for cutting. " +
        "Slide the set 15.0 mm right.",
    );
  });

  test("too close for the saw is another thing than over it", () => {
    expect(sentence(onWood(0, 1_200, null), true)).toBe(
      "Front 2 lies 1.2 mm too close for the saw to front 1 of Left cabinet, Pair of bedside cabinets, which is issued for " +
        "cutting. No slide along the board clears it: let the front loose or take another board.",
    );
  });

  test("wood that nothing is known of any more is told of without a name", () => {
    expect(sentence(onWood(12_000, 15_000, -15_000), null)).toBe(
      "Front 2 lies 12.0 mm over the wood of another face. Slide the set 15.0 mm left.",
    );
  });
});

describe("a board that other faces have too", () => {
  const holder = { faceId: "f1", faceTitle: "Left cabinet", jobTitle: "Bedsides", issued: false, samePicture: true };

  test("which of their fronts lie on it, and whether they are issued", () => {
    expect(heldBySentence(holder, ["1", "2", "3"])).toBe(
      "Fronts 1–3 of Left cabinet (Bedsides) lie on this board too, laid out, not issued.",
    );
    expect(heldBySentence({ ...holder, issued: true }, ["2"])).toBe(
      "Front 2 of Left cabinet (Bedsides) lies on this board too, issued for cutting.",
    );
    expect(heldBySentence(holder, [])).toBe("Left cabinet (Bedsides) has this board on its table too, with no front on it yet.");
  });

  test("on another picture it says that nobody can tell", () => {
    expect(heldBySentence({ ...holder, samePicture: false }, [])).toBe(
      "Left cabinet (Bedsides) has this board too, laid out, not issued, but on another picture of it: whether the fronts " +
        "overlap cannot be told. Bring both to the newest picture, or measure on the board.",
    );
  });

  test("each front for those who hear the table", () => {
    const wood = { ...whose, id: "w1", faceId: "f1", rect: { x: um(0), y: um(0), width: um(1), height: um(1) } };
    const kerfs = { along: um(0), across: um(0) };
    expect(spokenForWords({ ...wood, kerfs, issued: true }, "on board B-007, 310.0 mm from the left end")).toBe(
      "Front 1 of Left cabinet, Pair of bedside cabinets, on board B-007, 310.0 mm from the left end, issued for cutting",
    );
  });
});

test("stock too thin is said with the board; a glue line near an edge leaves the choice to the maker", () => {
  const print = (problem: Problem) => sentence(problem, null);
  expect(print({ kind: "too-thin", stockId: "b", pieces: ["p1", "p2"], missing: um(3_000) })).toBe(
    "Fronts 1–2 need stock 3.0 mm thicker than board B-007.",
  );
  expect(print({ kind: "glue-line", piece: "p4", at: um(80_000), fromEdge: um(6_000) })).toBe(
    "Front 4 has a glue line 6.0 mm from its long edge, where so narrow a strip may part. Slide it across the board, or leave it.",
  );
});
