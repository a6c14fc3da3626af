/** Planning a blank on the screen, and taking over from a board's other side: pure parts. */
import { describe, expect, test } from "vitest";
import {
  type BlankDraft,
  changedMember,
  freshBlank,
  planOf,
  shiftedBoard,
  withBoard,
  withoutBoard,
} from "@/components/blank/blank-draft";
import { fromOtherSide } from "@/components/zones/other-side";
import { type ComposedBlank, composeBlank, type StockPoint, um, umFromMm } from "@/lib/layout";
import type { BoardRow } from "@/lib/schemas/board";
import type { Zones } from "@/lib/schemas/zones";
import { blankConcerns } from "@/lib/words/blank-concern";
import { sidesWords } from "@/lib/words/sides";

const row = (tag: string, more: Partial<BoardRow> = {}): BoardRow => ({
  id: `id of ${tag}`,
  tag,
  kind: "board",
  state: "rack",
  species: "ash",
  cut: "flat",
  nominalQuarters: 4,
  thickness: umFromMm(27),
  length: umFromMm(1200),
  width: umFromMm(200),
  place: "",
  source: "",
  costMinor: null,
  note: "",
  trueEdges: "none",
  toBeFlattened: false,
  moisturePercent: null,
  boardFeet: 0,
  volumeBoardFeet: 0,
  straighteningId: `face of ${tag}`,
  backStraighteningId: null,
  picture: null,
  held: [],
  inBlank: null,
  revision: 1,
  createdAt: "2026-03-14T09:30:00.000Z",
  ...more,
});

const [a, b, c] = [row("B-001"), row("B-002"), row("B-003")];
const tags = ({ members }: BlankDraft) => members.map(({ board }) => board.tag);
const draft = freshBlank([a, b, c], umFromMm(1.5));

describe("boards of a blank in the making", () => {
  test("are put in once, moved up and down as far as it goes, and taken out", () => {
    expect(withBoard(draft, a)).toBe(draft);
    expect(tags(withBoard(draft, row("B-004")))).toEqual(["B-001", "B-002", "B-003", "B-004"]);
    expect(tags(shiftedBoard(draft, b.id, -1))).toEqual(["B-002", "B-001", "B-003"]);
    expect(tags(shiftedBoard(draft, b.id, 1))).toEqual(["B-001", "B-003", "B-002"]);
    expect(shiftedBoard(draft, a.id, -1)).toBe(draft);
    expect(shiftedBoard(draft, c.id, 1)).toBe(draft);
    expect(tags(withoutBoard(draft, a.id))).toEqual(["B-002", "B-003"]);
  });

  test("lie in by so much from the one farthest left, whichever was moved", () => {
    const alongs = ({ members }: BlankDraft) => members.map(({ along }) => along);
    const moved = changedMember(draft, b.id, { along: um(30_000) });
    expect(alongs(moved)).toEqual([0, 30_000, 0]);
    expect(alongs(changedMember(moved, a.id, { along: um(-20_000) }))).toEqual([0, 50_000, 20_000]);
    expect(alongs(withoutBoard(changedMember(moved, c.id, { along: um(10_000) }), a.id))).toEqual([20_000, 0]);
  });

  test("are sent with the picture of the side that comes up; without one there is nothing to send", () => {
    const turned = row("B-004", { backStraighteningId: "back of B-004" });
    const up = changedMember(freshBlank([a, turned], um(0)), turned.id, { side: "back", endForEnd: true });
    expect(planOf(up)?.members.map(({ straighteningId }) => straighteningId)).toEqual(["face of B-001", "back of B-004"]);
    expect(planOf(changedMember(draft, a.id, { side: "back" }))).toBeNull();
  });
});

describe("what a maker is told before gluing", () => {
  const member = (id: string, more: object = {}) => ({
    id,
    length: umFromMm(1200),
    width: umFromMm(200),
    thickness: umFromMm(27),
    outline: null as readonly StockPoint[] | null,
    keepClear: [],
    glueLines: [],
    endForEnd: false,
    along: um(0),
    trim: { upper: um(0), lower: um(0) },
    ...more,
  });
  const composed = (...members: ReturnType<typeof member>[]): ComposedBlank => {
    const outcome = composeBlank({ members, jointing: um(0) });
    if (!outcome.ok) throw new Error(outcome.refusal.reason);
    return outcome.blank;
  };
  const mm = { unit: "mm" } as const;

  test("is nothing where nothing is amiss", () => {
    expect(blankConcerns(composed(member(a.id), member(b.id)), [a, b], mm)).toEqual([]);
  });

  test("is how much of a joint is sound, and that a part is left out", () => {
    const p = (x: number, y: number): StockPoint => ({ x: umFromMm(x), y: umFromMm(y) });
    const outline = [p(0, 0), p(1200, 0), p(1200, 200), p(300, 200), p(200, 190), p(0, 190)];
    expect(blankConcerns(composed(member(a.id, { outline }), member(b.id)), [a, b], mm)).toEqual([
      "The joint of B-001 and B-002 has usable wood on both sides along 900.0 mm of 1200.0 mm. Trim an edge back to sound wood.",
    ]);
    const short = [p(0, 0), p(1200, 0), p(1200, 190), p(0, 190)];
    expect(blankConcerns(composed(member(a.id, { outline: short }), member(b.id)), [a, b], mm)).toEqual([
      expect.stringContaining("along 0.0 mm of 1200.0 mm"),
      "A part of the usable wood hangs together with nothing and is left out of the outline. Trim edges back to sound wood.",
    ]);
  });

  test("is wood, moisture and thickness that differ, with by how much", () => {
    const oak = row("B-004", { species: "oak", moisturePercent: 11.2, thickness: umFromMm(28.5) });
    const dry = row("B-005", { moisturePercent: 9.1 });
    expect(blankConcerns(composed(member(dry.id), member(oak.id)), [dry, oak], mm)).toEqual([
      "These boards are of different woods: ash, oak. They move differently.",
      "B-004 was read at 11.2 % moisture, B-005 at 9.1 %. Let them come together before they are glued.",
      "The boards differ by 1.5 mm in thickness: flatten the blank to the thinnest.",
    ]);
    const near = row("B-006", { moisturePercent: 11.1 });
    expect(blankConcerns(composed(member(dry.id), member(near.id)), [dry, near], mm)).toEqual([]);
  });
});

describe("what is offered from the other side", () => {
  const size = { length: umFromMm(1200), width: umFromMm(200) };
  const at = (x: number, y: number): StockPoint => ({ x: umFromMm(x), y: umFromMm(y) });
  const knot = {
    id: "k",
    kind: "knot" as const,
    area: { shape: "ellipse" as const, centre: at(400, 60), radiusX: umFromMm(20), radiusY: umFromMm(10), turnDeg: 30 },
    note: "goes through",
  };
  const other: Pick<Zones, "outline" | "keepClear" | "glueLines"> = {
    outline: [at(0, 0), at(1200, 0), at(1200, 180), at(0, 180)],
    keepClear: [knot],
    glueLines: [{ id: "g", across: umFromMm(70), aboveBoardId: "above", belowBoardId: "below" }],
  };
  const nothing = { outline: null, keepClear: [], glueLines: [] };

  test("lies turned over about the long edge, notes and all", () => {
    const { areas, outline, glueLines, off } = fromOtherSide(other, nothing, size);
    expect(areas).toEqual([{ ...knot, area: { ...knot.area, centre: at(400, 140), turnDeg: -30 } }]);
    expect(outline).toEqual(expect.arrayContaining([at(0, 20), at(1200, 20), at(1200, 200), at(0, 200)]));
    expect(glueLines).toEqual([{ id: "g", across: umFromMm(130), aboveBoardId: "below", belowBoardId: "above" }]);
    expect(off).toBe(0);
  });

  test("is not offered again once it is here, whatever it is called here", () => {
    const { areas, outline, glueLines } = fromOtherSide(other, nothing, size);
    const taken = { outline, keepClear: areas.map((area) => ({ ...area, id: "mine", note: "" })), glueLines };
    expect(fromOtherSide(other, taken, size)).toMatchObject({ areas: [], outline: null, glueLines: [] });
  });

  test("of two sizes that do not agree is told with by how much", () => {
    expect(sidesWords({ lengthBy: um(6_200), widthBy: um(-3_000) }, { unit: "mm" })).toBe(
      "The back comes out 6.2 mm longer and 3.0 mm narrower than the face. Check the sizes and corners of both: a knot carried from one side to the other would lie that far off.",
    );
  });
});
