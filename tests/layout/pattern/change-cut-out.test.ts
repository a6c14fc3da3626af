import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  addDivider,
  type CutOutChange,
  type CutOutFace,
  changeAnchor,
  type FaceLayout,
  facePieces,
  faceSize,
  freshCutOut,
  freshLayout,
  layOut,
  layoutFaults,
  letLoose,
  moveDivider,
  moveRow,
  moveStrip,
  placeGroup,
  removePart,
  rowFace,
  swapPieces,
  um,
  umFromMm,
} from "@/lib/layout";
import { accepted, arbitraryCutOutFace, arbitraryLayoutOf, umBetween } from "../arbitrary-layout";

const cut = { kerf: umFromMm(3), cleanUpBefore: um(200), cleanUpAfter: um(300) };
const cuts = { crosscut: cut, rip: cut, spacing: "followGap" as const };

/** Two rows of three fronts with dividers: strip p1, row p2–p8, strip p9, row p10–p16, strip p17. */
function frame(): FaceLayout {
  const fresh = freshCutOut({
    grain: "horizontal",
    length: umFromMm(1000),
    rows: 2,
    fronts: 3,
    rowHeight: umFromMm(120),
    strip: umFromMm(40),
    end: umFromMm(50),
    divider: umFromMm(30),
    gap: umFromMm(2),
  });
  if (!fresh.ok) throw new Error(fresh.reason);
  return accepted(placeGroup(freshLayout(fresh.face, cuts), "set", "b1", { x: umFromMm(30), y: umFromMm(5) }, 0));
}

function done(change: CutOutChange): FaceLayout {
  if (!change.ok) throw new Error(JSON.stringify(change.refusal));
  expect(layoutFaults(change.layout)).toEqual([]);
  return change.layout;
}

function railOf({ face }: FaceLayout): CutOutFace {
  if (face.pattern !== "cutOut") throw new Error("not a cut-out");
  return face;
}

const widths = (layout: FaceLayout, row: number) => railOf(layout).rows[row]?.parts.map(({ width }) => width / 1000);
const wood = (layout: FaceLayout) =>
  new Map(
    layOut(layout).map(({ id, stockFromFace, outline }) => [id, { ...stockFromFace, corner: outline[0], far: outline[2] }]),
  );

describe("freshCutOut", () => {
  test("three openings in 1 m with 50 mm ends and 30 mm dividers are 280 mm each", () => {
    expect(widths(frame(), 0)).toEqual([50, 280, 30, 280, 30, 280, 50]);
    expect(railOf(frame()).fitting).toBe(2_000);
  });

  test("fronts meant to be equal are equal, and what is left over widens the last end", () => {
    const wish = {
      grain: "vertical",
      length: um(1_000_001),
      rows: 1,
      fronts: 3,
      rowHeight: um(90_000),
      strip: um(30_000),
    } as const;
    const fresh = freshCutOut({ ...wish, end: um(50_000), divider: um(30_000), gap: um(2_000) });
    if (!fresh.ok) throw new Error(fresh.reason);
    expect(fresh.opening).toBe(280_000);
    expect(fresh.face.rows[0]?.parts.at(-1)).toEqual({ kind: "fixed", width: 50_001 });
    expect(faceSize(fresh.face)).toEqual({ width: 150_000, height: 1_000_001 });
    expect(freshCutOut({ ...wish, end: um(498_000), divider: um(0), gap: um(2_000) })).toMatchObject({
      ok: false,
      reason: "no-room",
    });
    expect(freshCutOut({ ...wish, fronts: 0, end: um(0), divider: um(0), gap: um(0) })).toEqual({
      ok: false,
      reason: "bad-count",
    });
  });
});

describe("moveDivider", () => {
  test("the opening before grows by what the one after loses; all other wood stays where it is", () => {
    const before = frame();
    const moved = done(moveDivider(before, { row: 0, part: 2 }, umFromMm(25)));
    expect(widths(moved, 0)).toEqual([50, 305, 30, 255, 30, 280, 50]);
    const [was, is] = [wood(before), wood(moved)];
    for (const id of was.keys()) {
      if (id === "p3" || id === "p4" || id === "p5") continue;
      expect(is.get(id)).toEqual(was.get(id));
    }
    // The divider is cut from wood 25 mm further on and hangs 25 mm further on.
    expect(is.get("p4")).toEqual({
      ...was.get("p4"),
      corner: { x: 355_000, y: 40_000 },
      far: { x: 385_000, y: 160_000 },
    });
  });

  test("refuses what is no divider and says how far it can go", () => {
    expect(moveDivider(frame(), { row: 0, part: 0 }, um(1))).toEqual({ ok: false, refusal: { reason: "not-a-divider" } });
    expect(moveDivider(frame(), { row: 0, part: 1 }, um(1))).toEqual({ ok: false, refusal: { reason: "not-a-divider" } });
    expect(moveDivider(frame(), { row: 2, part: 2 }, um(1))).toEqual({ ok: false, refusal: { reason: "no-such-place" } });
    const row = freshLayout(rowFace([um(9)], um(9), um(0), "horizontal"), cuts);
    expect(moveDivider(row, { row: 0, part: 2 }, um(1))).toEqual({ ok: false, refusal: { reason: "not-a-cut-out" } });
    // 280 mm less 2 + 2 mm of gaps and the 10 mm that are always left of a front.
    const refusal = { reason: "no-room", least: -266_000, most: 266_000 };
    expect(moveDivider(frame(), { row: 0, part: 2 }, umFromMm(267))).toEqual({ ok: false, refusal });
    expect(moveDivider(frame(), { row: 0, part: 2 }, umFromMm(-267))).toEqual({ ok: false, refusal });
    expect(moveDivider(frame(), { row: 0, part: 2 }, umFromMm(266)).ok).toBe(true);
    expect(moveDivider(frame(), { row: 0, part: 2 }, umFromMm(276), um(0)).ok).toBe(false);
    expect(moveDivider(frame(), { row: 0, part: 2 }, umFromMm(275), um(1_000)).ok).toBe(true);
  });

  test("an anchor at the divider itself does not make the rail move instead", () => {
    const before = accepted(changeAnchor(frame(), { piece: "p4" }, "centre"));
    const moved = done(moveDivider(before, { row: 0, part: 2 }, umFromMm(-10)));
    expect(wood(moved).get("p1")).toEqual(wood(before).get("p1"));
    expect(wood(moved).get("p2")).toEqual(wood(before).get("p2"));
  });

  test("moved there and back again the layout is as it was, however its pieces lie", () => {
    fc.assert(
      fc.property(arbitraryLayoutOf(arbitraryCutOutFace), umBetween(-40_000, 40_000), (layout, by) => {
        const part = layout.face.rows[0]?.parts.findIndex(({ kind }, index) => kind === "fixed" && index > 0) ?? 0;
        const change = moveDivider(layout, { row: 0, part }, by);
        if (!change.ok || change.swapsUndone.length > 0) return;
        expect(layoutFaults(change.layout)).toEqual([]);
        expect(faceSize(change.layout.face)).toEqual(faceSize(layout.face));
        expect(done(moveDivider(change.layout, { row: 0, part }, um(-by)))).toEqual(layout);
      }),
    );
  });
});

describe("moveStrip and moveRow", () => {
  test("a strip between two rows takes from one and gives to the other; a row moves between its strips", () => {
    const moved = done(moveStrip(frame(), 1, umFromMm(-15)));
    expect(railOf(moved).rows.map(({ height }) => height / 1000)).toEqual([105, 135]);
    expect(wood(moved).get("p17")).toEqual(wood(frame()).get("p17"));
    const up = done(moveRow(frame(), 0, umFromMm(-15)));
    expect(railOf(up).strips.map((strip) => strip / 1000)).toEqual([25, 55, 40]);
    expect(wood(up).get("p12")).toEqual(wood(frame()).get("p12"));
  });

  test("refusals", () => {
    expect(moveStrip(frame(), 0, um(1))).toEqual({ ok: false, refusal: { reason: "outer-strip" } });
    expect(moveStrip(frame(), 2, um(1))).toEqual({ ok: false, refusal: { reason: "outer-strip" } });
    expect(moveStrip(frame(), 3, um(1))).toEqual({ ok: false, refusal: { reason: "no-such-place" } });
    expect(moveStrip(frame(), 1, umFromMm(107))).toEqual({
      ok: false,
      refusal: { reason: "no-room", least: -106_000, most: 106_000 },
    });
    expect(moveRow(frame(), 0, umFromMm(31))).toEqual({
      ok: false,
      refusal: { reason: "no-room", least: -30_000, most: 30_000 },
    });
  });
});

describe("addDivider and removePart", () => {
  test("a divider parts a front in its middle; taken out again the layout is as it was", () => {
    const parted = done(addDivider(frame(), { row: 0, part: 3 }, umFromMm(30)));
    expect(widths(parted, 0)).toEqual([50, 280, 30, 125, 30, 125, 30, 280, 50]);
    expect(facePieces(parted)).toHaveLength(19);
    expect(done(removePart(parted, { row: 0, part: 4 }))).toEqual(frame());
  });

  test("what lies loose or has changed places keeps its wood under its new number", () => {
    const loose = accepted(letLoose(accepted(swapPieces(frame(), "p11", "p13")), "p15"));
    const lying = accepted(placeGroup(loose, "loose-1", "b2", { x: um(7_000), y: um(9_000) }, 2));
    const parted = done(addDivider(lying, { row: 0, part: 1 }, umFromMm(30)));
    expect(parted.groups.map(({ id, pieceIds, takesPlaceOf }) => [id, pieceIds.length, takesPlaceOf])).toEqual([
      ["set", 18, { p13: "p15", p15: "p13" }],
      ["loose-1", 1, {}],
    ]);
    const place = (layout: FaceLayout, id: string) => {
      const piece = layOut(layout).find((one) => one.id === id);
      return [piece?.stockId, piece?.stockFromFace];
    };
    expect(place(parted, "p17")).toEqual(place(lying, "p15"));
    const back = removePart(parted, { row: 0, part: 2 });
    expect(done(back)).toEqual(lying);
  });

  test("an anchor at a part that is taken out is given up, a swap it had a part in is undone", () => {
    const swapped = accepted(changeAnchor(accepted(swapPieces(frame(), "p3", "p5")), { piece: "p4" }, "top"));
    const joined = removePart(swapped, { row: 0, part: 2 });
    expect(done(joined).anchorX).toBe("centre");
    expect(done(joined).groups[0]?.takesPlaceOf).toEqual({});
    expect(widths(done(joined), 0)).toEqual([50, 590, 30, 280, 50]);
  });

  test("a front taken out leaves the fixed parts beside it as one; the last front of a row stays", () => {
    const two = done(removePart(frame(), { row: 0, part: 1 }));
    expect(widths(two, 0)).toEqual([360, 280, 30, 280, 50]);
    const one = done(removePart(two, { row: 0, part: 1 }));
    expect(removePart(one, { row: 0, part: 1 })).toEqual({ ok: false, refusal: { reason: "last-front" } });
    expect(removePart(one, { row: 0, part: 0 })).toEqual({ ok: false, refusal: { reason: "not-a-divider" } });
  });

  test("refuses a divider that leaves no room for two fronts", () => {
    // Twice 2 + 2 mm of gaps and 10 mm of front beside 260 mm of divider need 288 mm.
    expect(addDivider(frame(), { row: 0, part: 1 }, umFromMm(260))).toEqual({
      ok: false,
      refusal: { reason: "opening-too-short", missing: 8_000 },
    });
    expect(addDivider(frame(), { row: 0, part: 2 }, umFromMm(20))).toEqual({ ok: false, refusal: { reason: "not-a-front" } });
  });
});
