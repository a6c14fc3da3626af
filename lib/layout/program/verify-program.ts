/** The last gate before a program is issued: carried out, it must leave exactly the pieces asked for, and no wood may be lost. */
import type { PieceId } from "../piece";
import { rectArea } from "./conservation";
import type { CutRequest } from "./cut-request";
import type { Conservation, CutProgram, Part } from "./program";
import { type ReplayFault, replay } from "./replay";

export type Verdict =
  | { readonly ok: true }
  | { readonly ok: false; readonly reason: "cannot-be-carried-out"; readonly step: number; readonly fault: ReplayFault }
  /** The piece comes out elsewhere, at another size, twice or not at all. */
  | { readonly ok: false; readonly reason: "piece-differs"; readonly piece: PieceId }
  /** A share of the wood is not what the replay finds, or the shares do not add up to the board; µm². */
  | { readonly ok: false; readonly reason: "wood-is-lost"; readonly share: keyof Conservation; readonly by: number };

export function verifyProgram(request: CutRequest, program: CutProgram): Verdict {
  const done = replay(request.board, request.boardEdges, program);
  if (!done.ok) return { ok: false, reason: "cannot-be-carried-out", step: done.step, fault: done.reason };
  const different = differentPiece(request, done.parts);
  if (different !== null) return { ok: false, reason: "piece-differs", piece: different };
  return verifyConservation(program.conservation, {
    stock: request.board.length * request.board.width,
    pieces: areaOf(done.parts, "piece"),
    kerf: done.dust.kerf,
    cleanUp: done.dust.cleanUp,
    offcuts: areaOf(done.parts, "offcut"),
    waste: areaOf(done.parts, "waste"),
  });
}

/** Pieces + kerf + clean-up + offcuts + waste = stock, and each share as found, exactly in µm². */
export function verifyConservation(said: Conservation, found: Conservation): Verdict {
  const shares: readonly (keyof Conservation)[] = ["pieces", "kerf", "cleanUp", "offcuts", "waste", "stock"];
  const share = shares.find((name) => said[name] !== found[name]);
  if (share) return { ok: false, reason: "wood-is-lost", share, by: said[share] - found[share] };
  const by = said.stock - (said.pieces + said.kerf + said.cleanUp + said.offcuts + said.waste);
  return by === 0 ? { ok: true } : { ok: false, reason: "wood-is-lost", share: "stock", by };
}

function differentPiece(request: CutRequest, parts: readonly Part[]): PieceId | null {
  for (const { pieceId, rect } of request.pieces) {
    const [made, second] = parts.filter((part) => part.pieceId === pieceId);
    const same = made && made.rect.x === rect.x && made.rect.y === rect.y && made.rect.width === rect.width;
    if (!same || made.rect.height !== rect.height || second) return pieceId;
  }
  const strange = parts.find((part) => part.kind === "piece" && !request.pieces.some(({ pieceId }) => pieceId === part.pieceId));
  return strange?.pieceId ?? null;
}

function areaOf(parts: readonly Part[], kind: Part["kind"]): number {
  return parts.filter((part) => part.kind === kind).reduce((sum, part) => sum + rectArea(part.rect), 0);
}
