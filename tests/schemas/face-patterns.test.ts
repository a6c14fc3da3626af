import fc from "fast-check";
import { expect, test } from "vitest";
import { cutOutPlan, type FaceLayout, freshLayout, freshWrap, resawnPlan, um, umFromMm, wrapPlan } from "@/lib/layout";
import { faceLayoutSchema, faceSchema } from "@/lib/schemas/layout";
import { arbitraryFace, arbitraryLayout } from "../layout/arbitrary-layout";

test("a layout of any pattern comes over the wire as it was sent", () => {
  fc.assert(
    fc.property(arbitraryLayout, (layout) => {
      const sent = JSON.stringify(layout).replace(/"b([12])"/g, '"0190a0a0-0000-7000-8000-00000000000$1"');
      expect(faceLayoutSchema.parse(JSON.parse(sent))).toEqual(JSON.parse(sent));
    }),
    { numRuns: 60 },
  );
});

test("a face that the core finds fault with is refused, with the fault named", () => {
  const mitre = { kind: "mitre", turnDeg: 90, parting: "oneBevel" } as const;
  const box = freshWrap({
    sides: [300, 200, 300, 200].map(umFromMm),
    height: umFromMm(90),
    thickness: umFromMm(18),
    grain: "horizontal",
    corner: mitre,
    closed: true,
  });
  expect(faceSchema.safeParse(box).success).toBe(true);
  const refused = faceSchema.safeParse({ ...box, corners: [mitre] });
  expect(refused.error?.issues.map(({ message }) => message)).toEqual(["the face does not hold together (corner-count)"]);
});

test("the plans of a pattern are the same for the same face, byte for byte, and there is one for its own pattern only", () => {
  const cut = { kerf: um(3_000), cleanUpBefore: um(200), cleanUpAfter: um(100) };
  fc.assert(
    fc.property(arbitraryFace, (face) => {
      const layout: FaceLayout = freshLayout(face, { crosscut: cut, rip: cut, spacing: "followGap" });
      const plans = (of: FaceLayout) => [cutOutPlan(of), wrapPlan(of), resawnPlan(of)];
      expect(JSON.stringify(plans(structuredClone(layout)))).toBe(JSON.stringify(plans(layout)));
      const found = plans(layout).map((plan) => plan !== null);
      expect(found).toEqual([face.pattern === "cutOut", face.pattern === "wrap", face.pattern === "resawn"]);
    }),
    { numRuns: 60 },
  );
});
