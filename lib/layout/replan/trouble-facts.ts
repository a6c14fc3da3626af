/** Why pieces cannot be cut from a part in hand as they lie in it. */
import { cutRefusal } from "../program/plan-cuts";
import { um } from "../units/um";
import type { InPart } from "./fit-in-part";
import type { RestPiece } from "./part-in-hand";
import { blankRect, everyEdge, reachBeyond } from "./rect-edge";
import { isOnSoundWood, requestForPart } from "./stands";
import type { PieceName, TroubleFact } from "./trouble";

export const nameOf = ({ pieceId, label }: RestPiece): PieceName => ({ pieceId, label });

export function troubleFacts({ held, pieces, sawing }: InPart): readonly TroubleFact[] {
  const short = pieces.flatMap((piece) =>
    everyEdge.flatMap((edge): TroubleFact[] => {
      const by = reachBeyond(blankRect(piece), held.part.rect, edge);
      return by > 0 ? [{ kind: "short", piece: nameOf(piece), edge, by: um(by) }] : [];
    }),
  );
  const close = pieces.flatMap((a, i) =>
    pieces.slice(i + 1).flatMap((b): TroubleFact[] => {
      const by = missingBetween(a, b, sawing.kerf);
      return by > 0 ? [{ kind: "too-close", pieces: [nameOf(a), nameOf(b)], by: um(by) }] : [];
    }),
  );
  const bad = pieces.filter((piece) => !isOnSoundWood(piece, held, sawing.board));
  const facts = [...short, ...close, ...bad.map((piece) => ({ kind: "bad-wood", piece: nameOf(piece) }) as const)];
  return facts.length > 0 ? facts : [{ kind: "no-cut", pieces: inTheWay({ held, pieces, sawing }).map(nameOf) }];
}

function inTheWay({ held, pieces, sawing }: Pick<InPart, "held" | "pieces" | "sawing">): readonly RestPiece[] {
  const refusal = cutRefusal(requestForPart(held, pieces, sawing));
  if (refusal?.reason === "blocked") return pieces.filter(({ pieceId }) => refusal.pieces.includes(pieceId));
  return refusal?.reason === "outside" ? pieces.filter(({ pieceId }) => pieceId === refusal.piece) : pieces;
}

/** By the cut that needs less: along the board or across it. */
function missingBetween(a: RestPiece, b: RestPiece, kerf: InPart["sawing"]["kerf"]): number {
  const [one, two] = [blankRect(a), blankRect(b)];
  const along = Math.max(one.x, two.x) - Math.min(one.x + one.width, two.x + two.width);
  const across = Math.max(one.y, two.y) - Math.min(one.y + one.height, two.y + two.height);
  return Math.min(kerf.crosscut - along, kerf.rip - across);
}
