import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { areaAt } from "@/components/zones/area-at";
import { type Ellipse, ellipseInBox, handlePlace, moveEllipseHandle } from "@/components/zones/ellipse-edit";
import { commit, redo, startHistory, undo } from "@/components/zones/history";
import { insertCorner, moveCorner, removeCorner, snapped, wholeBoard } from "@/components/zones/polygon-edit";
import { docFault, withArea, withoutArea } from "@/components/zones/zones-doc";
import { um } from "@/lib/layout";
import type { KeepClearArea } from "@/lib/schemas/zones";

const size = { length: um(2_000_000), width: um(200_000) };
const at = (x: number, y: number) => ({ x: um(x), y: um(y) });
const knot = (id: string, area: KeepClearArea["area"]): KeepClearArea => ({ id, kind: "knot", area, note: "" });
const ellipse = (x: number, y: number, radiusX: number, radiusY: number, turnDeg = 0): Ellipse => ({
  shape: "ellipse",
  centre: at(x, y),
  radiusX: um(radiusX),
  radiusY: um(radiusY),
  turnDeg,
});

describe("the outline", () => {
  test("starts as the whole board, which is sound", () => {
    expect(docFault({ outline: wholeBoard(size), keepClear: [], glueLines: [] }, size)).toBeNull();
  });

  test("snaps to edges and corners within reach, is kept on the board, and else stays where it is put", () => {
    expect(snapped({ x: 3000, y: 150_000 }, size, 5000, true)).toEqual(at(0, 150_000));
    expect(snapped({ x: 1_996_000, y: 203_000 }, size, 5000, true)).toEqual(at(2_000_000, 200_000));
    expect(snapped({ x: 5000.6, y: 90_000.4 }, size, 5000, true)).toEqual(at(5001, 90_000));
    expect(snapped({ x: -80_000, y: 500_000 }, size, 5000, true)).toEqual(at(0, 200_000));
    expect(snapped({ x: -80_000, y: 90_000 }, size, 5000, false)).toEqual(at(-80_000, 90_000));
  });

  test("a new corner lies halfway on its edge, the last edge included, and changes nothing of the shape", () => {
    const board = wholeBoard(size);
    expect(insertCorner(board, 0)[1]).toEqual(at(1_000_000, 0));
    expect(insertCorner(board, 3)[4]).toEqual(at(0, 100_000));
    expect(docFault({ outline: insertCorner(board, 3), keepClear: [], glueLines: [] }, size)).toBeNull();
  });

  test("a triangle keeps its corners", () => {
    const triangle = wholeBoard(size).slice(0, 3);
    expect(removeCorner(triangle, 0)).toEqual(triangle);
    expect(removeCorner(wholeBoard(size), 0)).toHaveLength(3);
  });

  test("that crosses itself is refused with the place", () => {
    const crossed = [at(0, 0), at(1_000_000, 100_000), at(1_000_000, 0), at(0, 100_000)];
    expect(docFault({ outline: crossed, keepClear: [], glueLines: [] }, size)).toMatchObject({
      of: "outline",
      fault: { fault: "crosses", at: { x: 500_000, y: 50_000 } },
    });
    expect(
      docFault({ outline: moveCorner(wholeBoard(size), 1, at(2_100_000, 0)), keepClear: [], glueLines: [] }, size),
    ).toMatchObject({
      fault: { fault: "outside", by: 100_000 },
    });
  });
});

describe("keep-clear areas", () => {
  test("may hang over the edge, but not lie off the board", () => {
    const over = knot("a", ellipse(0, 0, 10_000, 10_000));
    expect(docFault({ outline: null, keepClear: [over], glueLines: [] }, size)).toBeNull();
    const off = knot("b", ellipse(-50_000, 0, 10_000, 10_000));
    expect(docFault({ outline: null, keepClear: [over, off], glueLines: [] }, size)).toEqual({
      of: "area",
      index: 1,
      fault: null,
    });
  });

  test("a box drawn from any corner gives the ellipse in it; a twitch gives none", () => {
    const wanted = ellipse(20_000, 15_000, 10_000, 5000);
    expect(ellipseInBox({ x: 10_000, y: 10_000 }, { x: 30_000, y: 20_000 })).toEqual(wanted);
    expect(ellipseInBox({ x: 30_000, y: 20_000 }, { x: 10_000, y: 10_000 })).toEqual(wanted);
    expect(ellipseInBox({ x: 0, y: 0 }, { x: 900, y: 90_000 })).toBeNull();
  });

  test("a handle dragged to where it stands changes nothing", () => {
    const tenths = fc.integer({ min: 10, max: 900 }).map((n) => n * 100);
    fc.assert(
      fc.property(tenths, tenths, fc.integer({ min: -179, max: 179 }), (radiusX, radiusY, turnDeg) => {
        const drawn = ellipse(500_000, 100_000, radiusX, radiusY, turnDeg);
        for (const handle of ["centre", "along", "across", "turn"] as const) {
          expect(moveEllipseHandle(drawn, handle, handlePlace(drawn, handle, 100_000), 100_000)).toEqual(drawn);
        }
      }),
    );
  });

  test("a turned ellipse is found where it is drawn, and not where it was before the turn", () => {
    const upright = [knot("a", ellipse(100_000, 100_000, 40_000, 5000, 90))];
    expect(areaAt(upright, { x: 100_000, y: 135_000 }, 0)?.id).toBe("a");
    expect(areaAt(upright, { x: 135_000, y: 100_000 }, 0)).toBeNull();
    expect(areaAt(upright, { x: 108_000, y: 100_000 }, 4000)?.id).toBe("a");
  });

  test("the one on top is found, and one that is hit before one that is only near", () => {
    const polygon = { shape: "polygon" as const, points: [at(0, 0), at(50_000, 0), at(50_000, 50_000), at(0, 50_000)] };
    const areas = [knot("below", polygon), knot("above", ellipse(20_000, 20_000, 5000, 5000))];
    expect(areaAt(areas, { x: 20_000, y: 20_000 }, 0)?.id).toBe("above");
    expect(areaAt(areas, { x: 27_000, y: 20_000 }, 5000)?.id).toBe("below");
    expect(areaAt(areas, { x: 52_000, y: 20_000 }, 5000)?.id).toBe("below");
    expect(areaAt(areas, { x: 60_000, y: 20_000 }, 5000)).toBeNull();
  });

  test("are replaced by id, added at the end, and taken away", () => {
    const a = knot("a", ellipse(0, 0, 1000, 1000));
    const doc = withArea({ outline: null, keepClear: [], glueLines: [] }, a);
    expect(withArea(doc, { ...a, kind: "stain" }).keepClear).toEqual([{ ...a, kind: "stain" }]);
    expect(withArea(doc, { ...a, id: "b" }).keepClear.map(({ id }) => id)).toEqual(["a", "b"]);
    expect(withoutArea(doc, "a").keepClear).toEqual([]);
  });
});

describe("undo", () => {
  test("walks back through all steps and forward again; a new step forgets what was undone", () => {
    let history = startHistory("0");
    for (const doc of ["1", "2", "3"]) history = commit(history, doc);
    history = undo(undo(history));
    expect(history.now).toBe("1");
    expect(redo(history).now).toBe("2");
    expect(redo(commit(history, "x")).now).toBe("x");
    expect(undo(startHistory("0")).now).toBe("0");
  });

  test("presses in a row with one key are one step, until something else comes between", () => {
    let history = startHistory(0);
    history = commit(history, 1, "corner");
    history = commit(history, 2, "corner");
    history = commit(history, 3);
    history = commit(history, 4, "corner");
    expect(undo(history).now).toBe(3);
    expect(undo(undo(history)).now).toBe(2);
    expect(undo(undo(undo(history))).now).toBe(0);
  });

  test("after an undo, the same key begins a step of its own", () => {
    const history = commit(undo(commit(startHistory(0), 1, "corner")), 2, "corner");
    expect(undo(history).now).toBe(0);
  });
});
