/** The sapwood's reach, held against the picture of the same face. */
import { expect, test } from "vitest";
import { type BoardOptions, boardFace, sawBoard } from "@/lib/sawmill/board-face";
import type { FacePicture } from "@/lib/sawmill/picture";
import { sapwoodAtFarEdge } from "@/lib/sawmill/sapwood-on-face";

const rift: BoardOptions = { species: "walnut", cut: "rift", lengthMm: 700, widthMm: 122, seed: 1 };

function reachOn(options: BoardOptions, count: number) {
  const board = sawBoard(options);
  return sapwoodAtFarEdge(board.log, board.plane, board, count);
}

/** Mean brightness of a strip of the face, 60 mm long about `xMm`. */
function brightness({ rgb, width, pxPerMm }: FacePicture, xMm: number, fromMm: number, toMm: number): number {
  let sum = 0;
  let pixels = 0;
  for (let y = Math.round(fromMm * pxPerMm); y < Math.round(toMm * pxPerMm); y++) {
    for (let x = Math.round((xMm - 30) * pxPerMm); x < Math.round((xMm + 30) * pxPerMm); x++) {
      for (let channel = 0; channel < 3; channel++) sum += rgb[(y * width + x) * 3 + channel] ?? 0;
      pixels += 3;
    }
  }
  return sum / pixels;
}

test("walnut is dark up to the reach and light at the far edge", () => {
  const face = boardFace({ ...rift, pxPerMm: 1 });
  // The first and the last place are ends of the board.
  const inside = reachOn(rift, 9).slice(1, -1);
  for (const { xMm, fromMm } of inside) {
    const heart = brightness(face, xMm, fromMm - 40, fromMm - 20);
    expect(brightness(face, xMm, fromMm - 6, fromMm - 1) - heart).toBeLessThan(15);
    expect(brightness(face, xMm, rift.widthMm - 4, rift.widthMm) - heart).toBeGreaterThan(50);
    // Cautious, but no more than the colour's stray either way and its blend.
    expect(brightness(face, xMm, fromMm + 12, fromMm + 16) - heart).toBeGreaterThan(50);
  }
});

test("a flat board from the middle of the log has none", () => {
  const flat: BoardOptions = { ...rift, cut: "flat", widthMm: 150, seed: 6 };
  expect(reachOn(flat, 5).map(({ fromMm }) => fromMm)).toEqual([150, 150, 150, 150, 150]);
});

test("places run from end to end; a single one lies in the middle", () => {
  expect(reachOn(rift, 3).map(({ xMm }) => xMm)).toEqual([0, 350, 700]);
  expect(reachOn(rift, 1).map(({ xMm }) => xMm)).toEqual([350]);
});
