import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  crossesGlueLine,
  type FaceLayout,
  freshLayout,
  layOut,
  placeGroup,
  rowFace,
  type Seam,
  seams,
  stackFace,
  um,
} from "@/lib/layout";
import { accepted, arbitraryLayout, boardOf, umBetween } from "../arbitrary-layout";

const cut = { kerf: um(3_000), cleanUpBefore: um(0), cleanUpAfter: um(0) };
const cuts = { crosscut: cut, rip: cut, spacing: "tight" as const };

function crossingOf(layout: FaceLayout, lines: readonly number[], index = 0) {
  const seam = seams(layout)[index];
  if (seam === undefined) throw new Error("no seam");
  const pieces = new Map(layOut(layout).map((piece) => [piece.id, piece]));
  return crossesGlueLine(seam, pieces, { id: "b1", glueLines: lines.map(um) });
}

/** Two fronts 100 mm high one above the other; the saw takes 3 mm between, from 120 to 123 mm. */
const stack = () =>
  accepted(
    placeGroup(
      freshLayout(stackFace([um(100_000), um(100_000)], um(300_000), um(2_000), "horizontal"), cuts),
      "set",
      "b1",
      { x: um(0), y: um(20_000) },
      0,
    ),
  );

describe("crossesGlueLine", () => {
  test("a rip along a glue line parts two boards of the blank, wherever in the kerf the line is", () => {
    for (const line of [120_000, 121_000, 123_000]) expect(crossingOf(stack(), [line])).toBe("everywhere");
    for (const line of [119_000, 124_000]) expect(crossingOf(stack(), [line])).toBe("nowhere");
    expect(crossingOf(stack(), [])).toBe("nowhere");
  });

  test("a crosscut goes over glue lines with both its sides alike: nowhere, while the figure runs on across the grain", () => {
    const face = rowFace([um(200_000), um(200_000)], um(150_000), um(2_000), "horizontal");
    const row = accepted(placeGroup(freshLayout(face, cuts), "set", "b1", { x: um(0), y: um(10_000) }, 0));
    expect(crossingOf(row, [60_000, 110_000])).toBe("nowhere");
    const { groups } = row;
    const [set] = groups;
    if (set?.placement == null) throw new Error("not placed");
    const at = set.placement.at;
    const parted: FaceLayout = {
      ...row,
      groups: [
        { ...set, pieceIds: ["p1"], placement: { ...set.placement, at: { x: um(100_000), y: um(85_000) } } },
        {
          ...set,
          id: "loose-1",
          pieceIds: ["p2"],
          placement: { ...set.placement, at: { x: um(at.x + 200_000), y: um(at.y + 9_000) } },
        },
      ],
    };
    expect(crossingOf(parted, [60_000])).toBe("partly");
  });

  test("agrees with asking point by point along the seam, a little inside either piece", () => {
    fc.assert(
      fc.property(arbitraryLayout, fc.array(umBetween(0, 900_000), { maxLength: 4 }), (layout, lines) => {
        const pieces = layOut(layout);
        const byId = new Map(pieces.map((piece) => [piece.id, piece]));
        const glueLines = [...new Set(lines)].sort((p, q) => p - q);
        for (const seam of seams(layout)) {
          const said = crossesGlueLine(seam, byId, boardOf("b1", 1, 1, { glueLines }));
          const [a, b] = [byId.get(seam.a), byId.get(seam.b)];
          if (a?.stockId !== "b1" || b?.stockId !== "b1") {
            expect(said).toBe("nowhere");
            continue;
          }
          const differs = Array.from({ length: 40 }, (_, step) => {
            const share = (step + 0.5) / 40;
            return member(a.stockFromFace, seam, share, "a", glueLines) !== member(b.stockFromFace, seam, share, "b", glueLines);
          });
          if (differs.includes(true)) expect(said).not.toBe("nowhere");
          if (differs.includes(false)) expect(said).not.toBe("everywhere");
          if (said === "everywhere") expect(differs.every((one) => one)).toBe(true);
          if (said === "nowhere") expect(differs.some((one) => one)).toBe(false);
        }
      }),
      { numRuns: 60 },
    );
  });

  function member(
    map: { b: number; d: number; ty: number },
    seam: Seam,
    share: number,
    side: "a" | "b",
    lines: readonly number[],
  ) {
    const start = side === "a" ? seam.from : seam.facing;
    const into = side === "a" ? -0.25 : 0.25;
    const x = start.x + share * (seam.to.x - seam.from.x) + (seam.normal === "right" ? into : 0);
    const y = start.y + share * (seam.to.y - seam.from.y) + (seam.normal === "down" ? into : 0);
    return lines.filter((line) => line <= map.b * x + map.d * y + map.ty).length;
  }
});
