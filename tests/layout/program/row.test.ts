import { describe, expect, test } from "vitest";
import { conservationLine } from "@/lib/layout/program/conservation-line";
import { boardEdges } from "@/lib/layout/program/cut-request";
import { planCuts } from "@/lib/layout/program/plan-cuts";
import type { CutProgram, CutStep } from "@/lib/layout/program/program";
import { front, request, row } from "./row-of-fronts";

function programFor(asked: ReturnType<typeof request>): CutProgram {
  const outcome = planCuts(asked);
  if (!outcome.ok) throw new Error(outcome.reason);
  return outcome.program;
}

/** A step as a line of the cut order, lengths in mm. */
function line(step: CutStep): string {
  const yields = step.yields.map(
    ({ kind, label, rect }) => `${kind} ${label ?? "-"} ${rect.width / 1000} x ${rect.height / 1000}`,
  );
  return `${step.number} ${step.kind} from ${step.fromEdgeState} ${step.fromEdge} ${step.setting / 1000} ${step.bladeSide}: ${yields.join(", ")}`;
}

describe("a row of four fronts 243.2 × 184, 3.0 mm apart, kerf 2.4", () => {
  const asked = request(2350, 230, row(4, 96, 14, 243.2, 184, 3), { boardEdges: boardEdges(false, true) });
  const program = programFor(asked);

  test("reads as a joiner would do it: true, rip rough, rip to height, square the end, then front by front off the long strip", () => {
    expect(program.steps.map(line)).toEqual([
      "1 true from rough top 2 far: board - 2350 x 228",
      "2 rip from trued top 196 near: strip A 2350 x 196, waste - 2350 x 29.6",
      "3 rip from sawn bottom 184 near: strip A 2350 x 184, waste - 2350 x 9.6",
      "4 crosscut from trued left 96 far: waste - 93.6 x 184, strip A 2254 x 184",
      "5 crosscut from sawn left 243.2 near: piece 1 243.2 x 184, strip A 2008.4 x 184",
      "6 crosscut from sawn left 0.6 far: strip A 2007.8 x 184",
      "7 crosscut from sawn left 243.2 near: piece 2 243.2 x 184, strip A 1762.2 x 184",
      "8 crosscut from sawn left 0.6 far: strip A 1761.6 x 184",
      "9 crosscut from sawn left 243.2 near: piece 3 243.2 x 184, strip A 1516 x 184",
      "10 crosscut from sawn left 0.6 far: strip A 1515.4 x 184",
      "11 crosscut from sawn left 243.2 near: piece 4 243.2 x 184, offcut C1 1269.8 x 184",
    ]);
    expect(program.settings).toBe(5);
    expect(program.search.proven).toBe(true);
  });

  test("adds up along the strip: fronts 972.8 + kerf 12.0 + slivers 1.8 + offcut 1269.8 + end 93.6 = board 2350.0", () => {
    expect(conservationLine(program)?.length).toEqual({
      fronts: 972_800,
      kerf: 12_000,
      slivers: 1_800,
      cleanUp: 0,
      offcuts: 1_269_800,
      waste: 93_600,
      board: 2_350_000,
    });
  });

  test("adds up in area to the last µm²", () => {
    const area = conservationLine(program)?.area;
    if (!area) throw new Error("a program has areas");
    const { board, ...shares } = area;
    expect(Object.values(shares).reduce((sum, share) => sum + share, 0)).toBe(board);
    expect(board).toBe(2_350_000 * 230_000);
    expect(area.cleanUp).toBe(2_350_000 * 2_000);
  });
});

describe("other rows", () => {
  test("a gap wider than loss and blade leaves slivers of waste, and clean-up counts in the sum", () => {
    const fronts = [0, 1, 2].map((i) => front(i + 1, 100 + i * 260, 20, 250, 150, 0.5));
    const sum = conservationLine(programFor(request(1500, 200, fronts)))?.length;
    // Between two: 10.0 − 2 × clean-up 0.5 = 9.0, of which 2 × 2.4 kerf and 4.2 sliver.
    expect(sum).toMatchObject({ fronts: 750_000, cleanUp: 3_000, slivers: 8_400 });
    const { board, ...shares } = sum ?? { board: 0 };
    expect(Object.values(shares).reduce((total, share) => total + share, 0)).toBe(board);
  });

  test("two rows have no sum along one strip", () => {
    const fronts = [front(1, 50, 10, 400, 80), front(2, 50, 100, 400, 80)];
    expect(conservationLine(programFor(request(1500, 200, fronts)))?.length).toBeNull();
  });

  test("two rows are ripped into long strips before any front is cut off, and one setting serves both strips in turn", () => {
    const fronts = [
      ...row(3, 50, 10, 250, 80, 2.4),
      ...row(3, 50, 92.4, 250, 80, 2.4).map((one, i) => ({ ...one, pieceId: `p${i + 4}`, label: `${i + 4}` })),
    ];
    const { steps } = programFor(request(1500, 200, fronts));
    const firstCrosscut = steps.findIndex((step) => step.kind === "crosscut");
    expect(steps.slice(firstCrosscut).every((step) => step.kind === "crosscut")).toBe(true);
    const numbers = steps.map((step) => step.settingNumber);
    const changes = numbers.filter((number, i) => number !== numbers[i - 1]).length;
    expect(changes).toBe(new Set(numbers).size);
  });

  test("a rest too short to hold brings the caution to clamp, a narrow rip the push stick", () => {
    const { steps } = programFor(request(600, 60, row(2, 20, 5, 250, 40, 3)));
    expect(steps.find((step) => step.kind === "rip")?.cautions).toContain("narrow-rip-push-stick");
    expect(steps.at(-1)?.cautions).toContain("short-crosscut-clamp");
  });
});
