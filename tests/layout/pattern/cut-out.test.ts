import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type CutOutFace,
  changeAnchor,
  cutOutPlan,
  drifts,
  type FaceLayout,
  faceFaults,
  facePieces,
  faceSize,
  freshCutOut,
  freshLayout,
  inverted,
  layOut,
  layoutFaults,
  letLoose,
  lyingPieces,
  moveGroup,
  type PieceId,
  pieceIdsOf,
  placeGroup,
  problems,
  quarterTurn,
  seams,
  toFace,
  turnedVector,
  um,
  umFromMm,
  woodNeeded,
} from "@/lib/layout";
import {
  accepted,
  arbitraryCut,
  arbitraryCutOutFace,
  arbitraryLayoutOf,
  arbitrarySetOf,
  arbitrarySpacing,
  boardOf,
} from "../arbitrary-layout";
import { type Bench, gluedUp, whereItEnds } from "./glue-up";

const loss = { kerf: umFromMm(3), cleanUpBefore: umFromMm(0.5), cleanUpAfter: umFromMm(0.5) };
const plain = { kerf: umFromMm(3), cleanUpBefore: um(0), cleanUpAfter: um(0) };

/** 1 m of rail: 50 mm ends, one 40 mm divider, two openings of 430 mm; 3 mm gaps, fitted by as much. */
function rail(): CutOutFace {
  const fresh = freshCutOut({
    grain: "horizontal",
    length: umFromMm(1000),
    rows: 1,
    fronts: 2,
    rowHeight: umFromMm(100),
    strip: umFromMm(40),
    end: umFromMm(50),
    divider: umFromMm(40),
    gap: umFromMm(3),
  });
  if (!fresh.ok) throw new Error(fresh.reason);
  return fresh.face;
}

function laid(face: CutOutFace, change: Partial<FaceLayout> = {}): FaceLayout {
  const fresh = { ...freshLayout(face, { crosscut: plain, rip: loss, spacing: "tight" }), ...change };
  return accepted(placeGroup(fresh, "set", "b1", { x: umFromMm(20), y: umFromMm(10) }, 0));
}

describe("a rail with two fronts", () => {
  test("reads strip, end, front, divider, front, end, strip", () => {
    expect(facePieces({ face: rail() }).map(({ id, role, rect }) => [id, role, rect.x, rect.y, rect.width, rect.height])).toEqual(
      [
        ["p1", "strip", 0, 0, 1_000_000, 40_000],
        ["p2", "fixed", 0, 40_000, 50_000, 100_000],
        ["p3", "front", 53_000, 43_000, 424_000, 94_000],
        ["p4", "fixed", 480_000, 40_000, 40_000, 100_000],
        ["p5", "front", 523_000, 43_000, 424_000, 94_000],
        ["p6", "fixed", 950_000, 40_000, 50_000, 100_000],
        ["p7", "strip", 0, 140_000, 1_000_000, 40_000],
      ],
    );
    expect(faceSize(rail())).toEqual({ width: 1_000_000, height: 180_000 });
  });

  test("fitted by its gap and spaced tight, part i moves by the kerfs before it: 0, 6 and 12 mm from a left anchor, ±6 from the centre", () => {
    const shifts = (layout: FaceLayout) =>
      cutOutPlan(layout)?.shifts.flatMap(({ role, shift }) => (role === "fixed" ? [shift?.along] : []));
    expect(shifts(laid(rail(), { anchorX: "left" }))).toEqual([0, -6_000, -12_000]);
    expect(shifts(laid(rail()))).toEqual([6_000, 0, -6_000]);
    expect(shifts(laid(rail(), { anchorX: "right" }))).toEqual([12_000, 6_000, 0]);
    expect(shifts(laid(rail(), { anchorX: { piece: "p4" } }))).toEqual([6_000, 0, -6_000]);
  });

  test("the strips close up by the rips: 4 mm each with jointed edges, 3 mm from the saw, shared about the middle", () => {
    const across = (face: CutOutFace) =>
      cutOutPlan(laid(face))?.shifts.flatMap(({ role, shift }) => (role === "strip" ? [shift?.across] : []));
    expect(across(rail())).toEqual([4_000, -4_000]);
    expect(across({ ...rail(), rails: "fromSaw" })).toEqual([3_000, -3_000]);
  });

  test("tells the wood it takes, the openings and how each front is trimmed", () => {
    const plan = cutOutPlan(laid(rail()));
    // Four kerfs of 3 mm along; across two rips with their jointing, and jointing on the outer edges.
    expect(plan?.wood).toEqual({ length: 1_012_000, width: 180_000 + 2 * 4_000 + 2 * 500 });
    expect(plan?.outside).toEqual({ width: 1_000_000, height: 180_000 });
    expect(plan?.openings.map(({ front, width, height }) => [front, width, height])).toEqual([
      ["p3", 430_000, 100_000],
      ["p5", 430_000, 100_000],
    ]);
    expect(plan?.fronts[0]).toEqual({
      front: "p3",
      sawn: { width: 430_000, height: 101_000 },
      trim: { left: 3_000, right: 3_000, top: 3_500, bottom: 3_500 },
      finished: { width: 424_000, height: 94_000 },
    });
    expect(plan?.crosscuts.map(({ a, b, gap, loss: gone, jump }) => [a, b, gap, gone, jump])).toEqual([
      ["p2", "p3", 3_000, 6_000, 3_000],
      ["p3", "p4", 3_000, 6_000, 3_000],
      ["p4", "p5", 3_000, 6_000, 3_000],
      ["p5", "p6", 3_000, 6_000, 3_000],
    ]);
  });

  test("glued seams have no gap; the seams of a strip are with every part beside it", () => {
    expect(seams(laid(rail())).map(({ a, b, gap, normal }) => [a, b, gap, normal])).toEqual([
      ["p1", "p2", 0, "down"],
      ["p1", "p3", 3_000, "down"],
      ["p1", "p4", 0, "down"],
      ["p1", "p5", 3_000, "down"],
      ["p1", "p6", 0, "down"],
      ["p2", "p3", 3_000, "right"],
      ["p2", "p7", 0, "down"],
      ["p3", "p4", 3_000, "right"],
      ["p3", "p7", 3_000, "down"],
      ["p4", "p5", 3_000, "right"],
      ["p4", "p7", 0, "down"],
      ["p5", "p6", 3_000, "right"],
      ["p5", "p7", 3_000, "down"],
      ["p6", "p7", 0, "down"],
    ]);
  });

  test("a part that lies on another board has no shift: no mark across the cuts can show the way", () => {
    const loose = accepted(letLoose(laid(rail()), "p4"));
    const away = accepted(placeGroup(loose, "loose-1", "b2", { x: um(0), y: um(0) }, 0));
    expect(cutOutPlan(away)?.shifts.map(({ piece, shift }) => [piece, shift?.along])).toEqual([
      ["p1", 0],
      ["p2", 6_000],
      ["p4", undefined],
      ["p6", -6_000],
      ["p7", 0],
    ]);
  });
});

describe("the closed form", () => {
  /** Σ of what is missing at the cuts before each part, from the losses alone. */
  function offsets({ face, crosscut, spacing }: FaceLayout & { readonly face: CutOutFace }, row: number): number[] {
    const [before, after] = face.grain === "horizontal" ? [face.gap.left, face.gap.right] : [face.gap.top, face.gap.bottom];
    const parts = face.rows[row]?.parts ?? [];
    const sums = [0];
    for (let cut = 1; cut < parts.length; cut++) {
      const [p, q] = [parts[cut - 1]?.kind, parts[cut]?.kind];
      const gap = (p === "front" ? after : 0) + (q === "front" ? before : 0);
      const gone =
        crosscut.kerf +
        (p === "front" ? face.fitting : crosscut.cleanUpBefore) +
        (q === "front" ? face.fitting : crosscut.cleanUpAfter);
      sums.push((sums.at(-1) ?? 0) + (spacing === "tight" ? gone : Math.max(gone, gap)) - gap);
    }
    return sums;
  }

  const inRow = (face: CutOutFace, row: number, part: number): PieceId => {
    const before = face.rows.slice(0, row).reduce((sum, { parts }) => sum + parts.length, row + 1);
    return `p${before + part + 1}`;
  };

  /** A vector of the wood as along and across the rail, by the turn that the set lies with. */
  function onRail({ face, groups }: FaceLayout, wood: { readonly along: number; readonly across: number }) {
    const back = inverted(quarterTurn(groups[0]?.placement?.turns ?? 0));
    const { x, y } = turnedVector(back, wood.along, wood.across);
    return face.grain === "horizontal" ? { along: x, across: y } : { along: y, across: x };
  }

  const driftsOf = (layout: FaceLayout) =>
    new Map(
      drifts(layout).map(({ piece, drift }) => [piece, onRail(layout, drift ?? { along: Number.NaN, across: Number.NaN })]),
    );

  test("drift of every part along the rail is its Σ less the anchor's, of every strip nothing, and the shift is the drift taken back", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryCutOutFace), (layout) => {
        const { face } = layout;
        const found = driftsOf(layout);
        const anchor = face.grain === "horizontal" ? layout.anchorX : layout.anchorY;
        face.rows.forEach((_, row) => {
          const sums = offsets(layout, row);
          const along = sums.map((_, part) => found.get(inRow(face, row, part))?.along ?? Number.NaN);
          const [still = Number.NaN, last = 0] = [along[0], sums.at(-1)];
          expect(along).toEqual(sums.map((sum) => still + sum));
          if (anchor === "left" || anchor === "top") expect(still).toBe(0);
          if (anchor === "right" || anchor === "bottom") expect(still + last).toBe(0);
          if (anchor === "centre") expect(Math.abs(2 * still + last)).toBeLessThanOrEqual(1);
        });
        for (const { id, role } of layOut(layout)) if (role === "strip") expect(found.get(id)?.along).toBe(0);
        if (typeof anchor === "object") expect(found.get(anchor.piece)?.along).toBe(0);
        for (const { piece, shift } of cutOutPlan(layout)?.shifts ?? []) {
          const drift = found.get(piece);
          expect([(shift?.along ?? 0) + (drift?.along ?? 0), (shift?.across ?? 0) + (drift?.across ?? 0)]).toEqual([0, 0]);
        }
      }),
      { numRuns: 30 },
    );
  });

  test("the jump of every seam is the closed form: along a row spacing less gap, between strip and row the rip's loss and the part's drift", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryCutOutFace), (layout) => {
        const { face, rip } = layout;
        const ripped = rip.kerf + (face.rails === "jointed" ? rip.cleanUpBefore + rip.cleanUpAfter : 0);
        const expected = new Map<string, { along: number; across: number }>();
        const still = driftsOf(layout);
        face.rows.forEach(({ parts }, row) => {
          const sums = offsets(layout, row);
          const [above, below] = [inRow(face, row, -1), inRow(face, row, parts.length)];
          parts.forEach((_, part) => {
            const id = inRow(face, row, part);
            const drift = still.get(id)?.along ?? Number.NaN;
            expected.set(`${above} ${id}`, { along: drift, across: ripped });
            expected.set(`${id} ${below}`, { along: 0 - drift, across: ripped });
            const jump = (sums[part] ?? 0) - (sums[part - 1] ?? 0);
            if (part > 0) expected.set(`${inRow(face, row, part - 1)} ${id}`, { along: jump, across: 0 });
          });
        });
        const found = seams(layout);
        expect(found).toHaveLength(expected.size);
        for (const { a, b, jump } of found) {
          if (jump === null) throw new Error("no jump");
          expect([jump.along.max, jump.across.max]).toEqual([jump.along.min, jump.across.min]);
          expect(onRail(layout, { along: jump.along.min, across: jump.across.min })).toEqual(expected.get(`${a} ${b}`));
        }
      }),
      { numRuns: 30 },
    );
  });
});

describe("the glued-up face", () => {
  test("has its finished size, every gap as specified all round each front, and is filled by strips, fixed parts and openings", () => {
    fc.assert(
      fc.property(arbitraryCutOutFace, (face) => {
        expect(faceFaults(face)).toEqual([]);
        const pieces = facePieces({ face });
        const { width, height } = faceSize(face);
        const area = pieces.reduce((sum, { role, rect }) => {
          const { left, right, top, bottom } = role === "front" ? face.gap : { left: 0, right: 0, top: 0, bottom: 0 };
          return sum + (rect.width + left + right) * (rect.height + top + bottom);
        }, 0);
        expect(area).toBe(width * height);
        for (const { id, rect, role } of pieces) {
          if (role !== "front") continue;
          for (const [side, gap] of Object.entries(face.gap)) {
            const beside = pieces.filter((other) => other.id !== id && touches(grown(rect, side, gap), other.rect, side));
            const facing = pieces.find(
              (other) =>
                other.id !== id &&
                other.role === "front" &&
                touches(grown(rect, side, gap + opposite(face, side)), other.rect, side),
            );
            expect(beside.length > 0 || facing !== undefined).toBe(true);
          }
        }
      }),
      { numRuns: 30 },
    );
  });

  const opposite = (face: CutOutFace, side: string) =>
    ({ left: face.gap.right, right: face.gap.left, top: face.gap.bottom, bottom: face.gap.top })[side] ?? 0;

  interface Box {
    readonly x: number;
    readonly y: number;
    readonly width: number;
    readonly height: number;
  }

  function grown({ x, y, width, height }: Box, side: string, by: number): Box {
    if (side === "left") return { x: x - by, y, width: width + by, height };
    if (side === "right") return { x, y, width: width + by, height };
    return side === "top" ? { x, y: y - by, width, height: height + by } : { x, y, width, height: height + by };
  }

  /** The one side of the first lies on the other side of the second, over some length. */
  function touches(a: Box, b: Box, side: string): boolean {
    const alongX = Math.min(a.x + a.width, b.x + b.width) > Math.max(a.x, b.x);
    const alongY = Math.min(a.y + a.height, b.y + b.height) > Math.max(a.y, b.y);
    if (side === "left") return a.x === b.x + b.width && alongY;
    if (side === "right") return a.x + a.width === b.x && alongY;
    return side === "top" ? a.y === b.y + b.height && alongX : a.y + a.height === b.y && alongX;
  }

  test("marks followed from the board through saw, clean-up and glue end where the maps show their wood", () => {
    const lineUps = fc.constantFrom<Bench["lineUp"]>("first", "last", "middle");
    fc.assert(
      fc.property(
        arbitraryCutOutFace,
        arbitraryCut,
        arbitraryCut,
        arbitrarySpacing,
        fc.oneof(
          lineUps,
          fc.nat(6).map((part) => ({ part })),
        ),
        (any, crosscut, rip, spacing, wish) => {
          const rows = typeof wish === "object" ? any.rows.slice(0, 1) : any.rows;
          const face = { ...any, grain: "horizontal" as const, rows, strips: any.strips.slice(0, rows.length + 1) };
          const lineUp = typeof wish === "object" ? { part: wish.part % (face.rows[0]?.parts.length ?? 1) } : wish;
          const parts = gluedUp({ face, crosscut, rip, spacing, lineUp });
          const anchorX =
            lineUp === "first"
              ? "left"
              : lineUp === "last"
                ? "right"
                : lineUp === "middle"
                  ? "centre"
                  : { piece: `p${lineUp.part + 2}` };
          const fresh = { ...freshLayout(face, { crosscut, rip, spacing }), anchorX, anchorY: "top" as const } as FaceLayout;
          const placed = accepted(placeGroup(fresh, "set", "b1", { x: um(0), y: um(0) }, 0));
          const lying = layOut(placed);
          const strip = lying[0];
          if (strip === undefined) throw new Error("no strip");
          // The bench counts from the near end of the strips.
          const [originX, originY] = [strip.stockFromFace.tx, strip.stockFromFace.ty];
          const { height } = faceSize(face);
          let followed = 0;
          let astray = 0;
          for (let y = 5_000; y < height + 40_000; y += 27_000) {
            for (let x = -40_000; x < 800_000; x += 1_000) {
              const end = whereItEnds(parts, { x, y });
              if (end === null) continue;
              const wood = { x: um(x + originX), y: um(y + originY) };
              const shown = lying.some(({ stockFromFace, outline }) => {
                const at = toFace(stockFromFace, wood);
                return at.x === end.x && at.y === end.y && inside(outline, at);
              });
              if (!shown) astray += 1;
              followed += 1;
            }
          }
          expect(followed).toBeGreaterThan(300);
          expect(astray).toBe(0);
        },
      ),
      { numRuns: 8 },
    );
  });

  function inside(
    outline: readonly { readonly x: number; readonly y: number }[],
    { x, y }: { readonly x: number; readonly y: number },
  ) {
    const [from, , to] = outline;
    return from !== undefined && to !== undefined && x >= from.x && x <= to.x && y >= from.y && y <= to.y;
  }
});

describe("in the wood", () => {
  test("no two blanks are nearer than the kerf between them, nothing outside the wood that is said to be needed", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryCutOutFace), (layout) => {
        const pieces = lyingPieces(layout);
        const { length, width } = woodNeeded(layout);
        const reach = (axis: "along" | "across") =>
          Math.max(...pieces.map(({ blank }) => blank[axis].to)) - Math.min(...pieces.map(({ blank }) => blank[axis].from));
        expect([reach("along"), reach("across")]).toEqual([length, width]);
        const board = boardOf("b1", 9_000_000, 9_000_000);
        expect(problems(layout, [board]).filter(({ kind }) => kind === "too-close")).toEqual([]);
        for (const a of pieces) {
          for (const b of pieces) {
            if (a.id >= b.id) continue;
            const room = (axis: "along" | "across") =>
              Math.max(a.blank[axis].from, b.blank[axis].from) - Math.min(a.blank[axis].to, b.blank[axis].to);
            expect(room("along") >= layout.crosscut.kerf || room("across") >= layout.rip.kerf).toBe(true);
          }
        }
      }),
      { numRuns: 30 },
    );
  });

  test("another anchor moves the strips along and leaves the crosscut parts of a single row where they are", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryCutOutFace), (layout) => {
        const wood = (one: FaceLayout) =>
          layOut(one).flatMap(({ id, role, stockFromFace }) => (role === "strip" ? [] : [{ id, stockFromFace }]));
        const parts = layout.face.rows.length === 1 ? undefined : 1;
        const anchored = accepted(changeAnchor(layout, "left", "bottom"));
        expect(wood(anchored).slice(0, parts)).toEqual(wood(layout).slice(0, parts));
        expect(accepted(changeAnchor(anchored, layout.anchorX, layout.anchorY))).toEqual(layout);
      }),
    );
  });

  test("a mirrored rail has the mirrored chart", () => {
    fc.assert(
      fc.property(
        arbitrarySetOf(arbitraryCutOutFace),
        fc.constantFrom<FaceLayout["anchorX"]>("left", "right"),
        (any, anchorX) => {
          const layout = { ...any, face: { ...any.face, grain: "horizontal" as const }, anchorX, anchorY: "top" as const };
          const { face, crosscut } = layout;
          const mirrored: FaceLayout = {
            ...layout,
            face: {
              ...face,
              gap: { ...face.gap, left: face.gap.right, right: face.gap.left },
              rows: face.rows.map(({ height, parts }) => ({ height, parts: [...parts].reverse() })),
            },
            crosscut: { ...crosscut, cleanUpBefore: crosscut.cleanUpAfter, cleanUpAfter: crosscut.cleanUpBefore },
            anchorX: anchorX === "left" ? "right" : "left",
          };
          const blanks = (one: FaceLayout, flip: boolean) => {
            const placed = accepted(placeGroup(one, "set", "b1", { x: um(0), y: um(0) }, 0));
            const spans = lyingPieces(placed).map(({ role, blank: { along, across } }) => ({ role, along, across }));
            const reach = Math.max(...spans.map(({ along }) => along.to)) + Math.min(...spans.map(({ along }) => along.from));
            return spans
              .map(({ role, along, across }) => ({
                role,
                along: flip ? { from: reach - along.to, to: reach - along.from } : along,
                across,
              }))
              .map((one) => JSON.stringify({ ...one, along: shifted(one.along, spans, flip, reach) }))
              .sort();
          };
          expect(blanks(mirrored, true)).toEqual(blanks(layout, false));
        },
      ),
    );
  });

  /** Counted from the near end of all blanks: a placement puts finished edges at its corner, clean-up may reach over it. */
  function shifted(
    along: { readonly from: number; readonly to: number },
    all: readonly { readonly along: { readonly from: number; readonly to: number } }[],
    flip: boolean,
    reach: number,
  ) {
    const starts = all.map((one) => (flip ? reach - one.along.to : one.along.from));
    const start = Math.min(...starts);
    return { from: along.from - start, to: along.to - start };
  }

  test("with vertical grain everything is the same with x and y exchanged", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryCutOutFace), (any) => {
        const face = { ...any.face, grain: "horizontal" as const };
        const { left, right, top, bottom } = face.gap;
        const upright = { ...face, grain: "vertical" as const, gap: { left: top, right: bottom, top: left, bottom: right } };
        const [across, down] = [facePieces({ face }), facePieces({ face: upright })];
        across.forEach(({ role, rect }, index) => {
          const { x, y, width, height } = rect;
          expect(down[index]).toMatchObject({ role, rect: { x: y, y: x, width: height, height: width } });
        });
        const settings = { ...any, anchorX: "left" as const, anchorY: "top" as const };
        expect(woodNeeded({ ...settings, face: upright })).toEqual(woodNeeded({ ...settings, face }));
      }),
    );
  });
});

describe("loose parts", () => {
  test("a front from another board keeps its place on the face; no jump is told between it and the rail", () => {
    const loose = accepted(letLoose(laid(rail()), "p5"));
    const away = accepted(placeGroup(loose, "loose-1", "b2", { x: um(30_000), y: um(40_000) }, 2));
    expect(layoutFaults(away)).toEqual([]);
    expect(
      seams(away)
        .filter(({ a, b }) => a === "p5" || b === "p5")
        .map(({ jump }) => jump),
    ).toEqual([null, null, null, null]);
    expect(seams(away).filter(({ jump }) => jump !== null)).toHaveLength(10);
  });

  test("the rail and its fronts come back whole after any slide", () => {
    fc.assert(
      fc.property(arbitraryLayoutOf(arbitraryCutOutFace), fc.nat(20), (layout, pick) => {
        const ids = pieceIdsOf(layout.face);
        const id = ids[pick % ids.length] ?? "p1";
        const change = letLoose(layout, id);
        if (!change.ok) return;
        expect(layOut(change.layout)).toEqual(layOut(layout));
        const group = change.layout.groups.find(({ pieceIds }) => pieceIds.includes(id));
        if (group?.placement === null || group === undefined) return;
        expect(layoutFaults(accepted(moveGroup(change.layout, group.id, { x: um(7), y: um(-9) })))).toEqual([]);
      }),
    );
  });
});
