/** Any command with any arguments, for properties over sequences of them. */
import fc from "fast-check";
import { changeLoss, changeSpacing, chooseAnchor, chooseSaw } from "@/lib/editor/commands/change-cuts";
import { changeGrain, changeSizes } from "@/lib/editor/commands/change-sizes";
import { letPiecesLoose, takePiecesBack } from "@/lib/editor/commands/loose";
import type { CommandOutcome } from "@/lib/editor/commands/outcome";
import { liftFromBoard, placeOnBoard } from "@/lib/editor/commands/place";
import { slideGroups } from "@/lib/editor/commands/slide";
import { swapTwo } from "@/lib/editor/commands/swap";
import { groupsOfPieces } from "@/lib/editor/commands/targets";
import { turnEndForEnd } from "@/lib/editor/commands/turn";
import type { TableDocument } from "@/lib/editor/document";
import { type AnchorX, type AnchorY, um, umFromMm } from "@/lib/layout";
import { boards, longBoard } from "./sample-table";

export type Command = (document: TableDocument) => CommandOutcome;

const piece = fc.integer({ min: 1, max: 5 }).map((number) => `p${number}`);
const pieces = fc.uniqueArray(piece, { maxLength: 3 });
const length = fc.integer({ min: -400_000, max: 400_000 }).map(um);
const allowance = fc.integer({ min: 0, max: 6_000 }).map(um);
const size = fc.integer({ min: 40, max: 400 }).map(umFromMm);
const groups = (document: TableDocument, ids: readonly string[]) => groupsOfPieces(document.layout, ids);

export const anyCommand: fc.Arbitrary<Command> = fc.oneof(
  fc.tuple(pieces, length, length).map(
    ([ids, x, y]): Command =>
      (d) =>
        slideGroups(d, groups(d, ids), { x, y }),
  ),
  pieces.map(
    (ids): Command =>
      (d) =>
        turnEndForEnd(d, groups(d, ids)),
  ),
  pieces.map(
    (ids): Command =>
      (d) =>
        swapTwo(d, ids),
  ),
  pieces.map(
    (ids): Command =>
      (d) =>
        letPiecesLoose(d, ids),
  ),
  pieces.map(
    (ids): Command =>
      (d) =>
        takePiecesBack(d, ids),
  ),
  fc.tuple(pieces, fc.constantFrom(...boards)).map(
    ([ids, board]): Command =>
      (d) =>
        placeOnBoard(d, groups(d, ids), board),
  ),
  pieces.map(
    (ids): Command =>
      (d) =>
        liftFromBoard(d, groups(d, ids)),
  ),
  fc.tuple(fc.constantFrom("rip" as const, "crosscut" as const), allowance, allowance, allowance).map(
    ([cut, kerf, cleanUpBefore, cleanUpAfter]): Command =>
      (d) =>
        changeLoss(d, cut, { kerf, cleanUpBefore, cleanUpAfter }),
  ),
  allowance.map(
    (kerf): Command =>
      (d) =>
        chooseSaw(d, "rip", { id: longBoard.id, name: "Band saw", kind: "band", kerf, cleanUp: um(100) }),
  ),
  fc.constantFrom("followGap" as const, "tight" as const).map(
    (spacing): Command =>
      (d) =>
        changeSpacing(d, spacing),
  ),
  fc
    .tuple(
      fc.oneof(
        fc.constantFrom<AnchorX[]>("left", "centre", "right"),
        piece.map((id): AnchorX => ({ piece: id })),
      ),
      fc.constantFrom<AnchorY[]>("top", "centre", "bottom"),
    )
    .map(
      ([x, y]): Command =>
        (d) =>
          chooseAnchor(d, x, y),
    ),
  fc.constantFrom("horizontal" as const, "vertical" as const).map(
    (grain): Command =>
      (d) =>
        changeGrain(d, grain),
  ),
  fc.tuple(fc.array(size, { minLength: 1, maxLength: 5 }), fc.array(size, { minLength: 1, maxLength: 2 }), allowance).map(
    ([columns, rows, gap]): Command =>
      (d) => {
        const gaps = (count: number) => Array.from({ length: count - 1 }, () => gap);
        const { grain } = d.layout.face;
        const between = { columnGaps: gaps(columns.length), rowGaps: gaps(rows.length) };
        return changeSizes(d, { pattern: "grid", columns, rows, ...between, grain });
      },
  ),
);
