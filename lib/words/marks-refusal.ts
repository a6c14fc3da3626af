/** Why marks on a photograph cannot be used, in plain words: what is wrong, by how much, and what would mend it. */
import { type CornerIndex, type LengthStyle, type MarkedRectangle, type MarksRefusal, printLength, umFromMm } from "@/lib/layout";

/** Corners in the order they are marked. */
const cornerNames: Readonly<Record<CornerIndex, string>> = {
  0: "upper left corner",
  1: "upper right corner",
  2: "lower right corner",
  3: "lower left corner",
};
const things: Readonly<Record<MarkedRectangle, string>> = { board: "board", sheet: "sheet" };
const edges = { top: "upper edge", right: "right end", bottom: "lower edge", left: "left end" } as const;

export function marksRefusalWords(refusal: MarksRefusal, style: LengthStyle): string {
  const print = (mm: number) => printLength(umFromMm(mm), style);
  switch (refusal.reason) {
    case "size":
      return `The size of the ${things[refusal.of]} must lie between ${print(10)} and ${print(30_000)}. Enter its true length and width.`;
    case "outside-photo":
      return `${markName(refusal.mark, refusal.index)} lies ${pixels(refusal.byPx)} outside the photograph. Move it onto the wood.`;
    case "tiny":
      return `The ${things[refusal.of]} is too small in the photograph: its shortest side has ${pixels(refusal.sidePx)}, at least ${pixels(refusal.neededPx)} are needed. Take the picture from nearer.`;
    case "folded":
      return `Two sides of the ${things[refusal.of]} cross. Two of its corners have changed places: mark them clockwise from the upper left.`;
    case "mirrored":
      return `The corners of the ${things[refusal.of]} are marked the wrong way round, which would show the wood in a mirror. Mark them clockwise from the upper left.`;
    case "not-convex":
      return `The ${cornerNames[refusal.corner]} of the ${things[refusal.of]} points inwards. Move it out to the true corner.`;
    case "in-line":
      return `The ${cornerNames[refusal.corner]} of the ${things[refusal.of]} lies ${degrees(refusal.angleDeg)} off the line between its neighbours. Move it to the true corner, or take the picture from higher up.`;
    case "scale-varies":
      return `${near(refusal.ratio)} Check the corners, or take the picture from farther away; at most ${refusal.limit} times can be used.`;
    case "too-flat":
      return `The ${things[refusal.of]} is seen ${times(refusal.ratio)} as large one way as the other; at most ${times(refusal.limit)} can be used. Check that length and width have not changed places, or take the picture from higher up.`;
    case "residual":
      return `The marks contradict each other: ${markName(refusal.worst, refusal.index).toLowerCase()} is off by ${print(refusal.mm)}, at most ${print(refusal.limitMm)} can be used. Check it, and the sizes entered.`;
    case "edge-point-off":
      return `Point ${refusal.index + 1} along the edges lies ${print(refusal.mm)} off the ${edges[refusal.edge]}; at most ${print(refusal.limitMm)} can be used. Move it onto the edge or remove it.`;
  }
}

function markName(mark: "corner" | "sheet-corner" | "extra" | "edge", index: number): string {
  if (mark === "extra") return `Further point ${index + 1}`;
  if (mark === "edge") return `Point ${index + 1} along the edges`;
  const corner = index === 0 || index === 1 || index === 2 || index === 3 ? cornerNames[index] : "corner";
  return `The ${corner} of the ${mark === "corner" ? "board" : "sheet"}`;
}

function near(ratio: number): string {
  return Number.isFinite(ratio)
    ? `One end would be ${times(ratio)} as near to the camera as the other.`
    : "One end would lie behind the camera.";
}

const pixels = (px: number) => (Number.isFinite(px) ? `${Math.round(px)} px` : "far");
const degrees = (deg: number) => `${deg.toFixed(1)}°`;
const times = (ratio: number) => `${ratio.toFixed(1)} times`;
