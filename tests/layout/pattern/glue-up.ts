/**
 * A bench in a test: pencil marks on a board, a saw that turns wood to dust, clean-up, and glue. Follows a mark from the uncut board
 * to the glued-up rail step by step, as the work is done, and knows nothing of charts and maps. Horizontal grain; lengths in µm.
 */
import type { CutLoss, CutOutFace, Spacing } from "@/lib/layout";

export interface Mark {
  readonly x: number;
  readonly y: number;
}

/** A part in hand: the wood between two x and two y of the uncut board, and where its corner comes in the finished face. */
export interface GluedPart {
  readonly role: "strip" | "fixed" | "front";
  readonly from: Mark;
  readonly to: Mark;
  readonly at: Mark;
}

export interface Bench {
  readonly face: CutOutFace;
  readonly crosscut: CutLoss;
  readonly rip: CutLoss;
  readonly spacing: Spacing;
  /** Which finished edge of a row is lined up with a pencil line across the rips: that of its first part, its last, or its middle. */
  readonly lineUp: "first" | "last" | "middle" | { readonly part: number };
}

/** Where a mark ends, or null where it has become dust or waste. */
export function whereItEnds(parts: readonly GluedPart[], { x, y }: Mark): Mark | null {
  const part = parts.find(({ from, to }) => x >= from.x && x <= to.x && y >= from.y && y <= to.y);
  return part === undefined ? null : { x: part.at.x + x - part.from.x, y: part.at.y + y - part.from.y };
}

/** The finished parts of the whole face, in reading order; the first strip's finished top edge is y = 0, the pencil line x = 0. */
export function gluedUp(bench: Bench): GluedPart[] {
  const { face, rip } = bench;
  const jointed = face.rails === "jointed";
  const [planedBelow, planedAbove] = jointed ? [rip.cleanUpBefore, rip.cleanUpAfter] : [0, 0];
  const length = face.rows[0]?.parts.reduce((sum, { width }) => sum + width, 0) ?? 0;
  const glued: GluedPart[] = [];
  // The rip fence moves down the board; the rail grows downward on the gluing bench.
  let [board, bench0] = [0, 0];
  face.strips.forEach((strip, index) => {
    glued.push({ role: "strip", from: { x: 0, y: board }, to: { x: length, y: board + strip }, at: { x: 0, y: bench0 } });
    board += strip + planedBelow + rip.kerf + planedAbove;
    bench0 += strip;
    const row = face.rows[index];
    if (row === undefined) return;
    const cut = crosscutRow(bench, index);
    const line = pencilLine(bench, index, cut);
    for (const { role, from, to, at } of cut) {
      const [top, bottom] = role === "front" ? [face.gap.top, face.gap.bottom] : [0, 0];
      glued.push({
        role,
        from: { x: from - line.inWood + line.onRail, y: board + top },
        to: { x: to - line.inWood + line.onRail, y: board + row.height - bottom },
        at: { x: at, y: bench0 + top },
      });
    }
    board += row.height + planedBelow + rip.kerf + planedAbove;
    bench0 += row.height;
  });
  return glued;
}

interface CrosscutPart {
  readonly role: "fixed" | "front";
  /** Finished ends in the ripped row, counted from where sawing starts. */
  readonly from: number;
  readonly to: number;
  /** Where the finished near end comes on the rail. */
  readonly at: number;
}

/** Saws a ripped row into its parts one after the other, trims them, and lays them out in their openings. */
function crosscutRow({ face, crosscut, spacing }: Bench, index: number): CrosscutPart[] {
  const parts = face.rows[index]?.parts ?? [];
  const { left, right } = face.gap;
  let [blade, opening] = [0, 0];
  return parts.map(({ kind, width }, part): CrosscutPart => {
    const front = kind === "front";
    const [near, far] = front ? [face.fitting, face.fitting] : [crosscut.cleanUpAfter, crosscut.cleanUpBefore];
    const finished = front ? width - left - right : width;
    if (part > 0 && spacing === "followGap") blade += sliver(parts[part - 1]?.kind === "front");
    const from = blade + near;
    const at = opening + (front ? left : 0);
    blade = from + finished + far + crosscut.kerf;
    opening += width;
    return { role: kind, from, to: from + finished, at };

    /** What a second cut takes out so that as much wood is gone as air will hang there. */
    function sliver(afterFront: boolean): number {
      const air = (afterFront ? right : 0) + (front ? left : 0);
      const gone = (afterFront ? face.fitting : crosscut.cleanUpBefore) + crosscut.kerf + near;
      return air > gone ? air - gone : 0;
    }
  });
}

/** The pencil line across the cuts, in the ripped row and on the finished rail. */
function pencilLine({ lineUp }: Bench, _index: number, cut: readonly CrosscutPart[]): { inWood: number; onRail: number } {
  const [first, last] = [cut[0], cut.at(-1)];
  if (first === undefined || last === undefined) throw new Error("no parts");
  const end = { inWood: last.to, onRail: last.at + last.to - last.from };
  if (lineUp === "first") return { inWood: first.from, onRail: first.at };
  if (lineUp === "last") return end;
  if (lineUp === "middle") {
    const spare = end.inWood - first.from - (end.onRail - first.at);
    return { inWood: first.from + Math.floor(spare / 2), onRail: first.at };
  }
  const part = cut[lineUp.part];
  if (part === undefined) throw new Error("no such part");
  return { inWood: part.from, onRail: part.at };
}
