import { expect, test } from "vitest";
import { layOut, layoutFaults } from "@/lib/layout";
import { faceLayoutSchema, faceSchema } from "@/lib/schemas/layout";
import { orderSnapshotSchema } from "@/lib/schemas/order-snapshot";
import golden from "@/tests/golden/order-before-patterns.json" with { type: "json" };

test("an order frozen before there were patterns is read as it was, its face a grid", () => {
  const read = orderSnapshotSchema.parse(golden);
  const [face] = read.faces;
  expect(face?.layout.face).toEqual({ pattern: "grid", ...golden.faces[0]?.layout.face });
  expect({ ...read, faces: [] }).toEqual({ ...golden, faces: [] });
  if (face === undefined) throw new Error("no face");
  expect(layoutFaults(face.layout)).toEqual([]);
  expect(layOut(face.layout).map(({ label }) => label)).toEqual(
    read.boards.flatMap(({ pieces }) => pieces.map(({ label }) => label)),
  );
});

test("what is written now names its pattern; a pattern that nobody knows is refused", () => {
  const layout = faceLayoutSchema.parse(golden.faces[0]?.layout);
  expect(faceLayoutSchema.parse(JSON.parse(JSON.stringify(layout)))).toEqual(layout);
  expect(faceSchema.safeParse({ ...layout.face, pattern: "zigzag" }).success).toBe(false);
});
