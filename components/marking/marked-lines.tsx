/** Lines between the corners and what each side of the board is, drawn over the photograph. Takes no pointer. */
import type { FourCorners } from "@/lib/layout";
import { type Place, type Size, toScreen, type View } from "../picture/view";
import type { Draft } from "./draft";
import { cornerNames, edgeNames } from "./mark-words";

export function MarkedLines({ draft, view, frame }: { draft: Draft; view: View; frame: Size }) {
  const board = onScreen(draft.corners, view);
  return (
    <svg className="absolute inset-0 size-full" aria-hidden="true">
      {draft.reference === "sheet" && <Outline corners={onScreen(draft.sheetCorners, view)} dashed />}
      <Outline corners={board} dashed={false} />
      <SideName corners={board} side={0} text={`${edgeNames.top} · grain →`} />
      <SideName corners={board} side={1} text={edgeNames.right} />
      <SideName corners={board} side={2} text={edgeNames.bottom} />
      <SideName corners={board} side={3} text={edgeNames.left} />
      {board.map((corner, index) => (
        <CornerNumber key={cornerNames[index]} at={corner} away={middle(board)} frame={frame} text={String(index + 1)} />
      ))}
      {draft.known && <Distance from={toScreen(view, draft.known.from)} to={toScreen(view, draft.known.to)} />}
    </svg>
  );
}

const onScreen = (corners: FourCorners, view: View): readonly Place[] => corners.map((corner) => toScreen(view, corner));
const middle = (corners: readonly Place[]): Place => ({
  x: corners.reduce((sum, { x }) => sum + x, 0) / corners.length,
  y: corners.reduce((sum, { y }) => sum + y, 0) / corners.length,
});

function Outline({ corners, dashed }: { corners: readonly Place[]; dashed: boolean }) {
  const points = corners.map(({ x, y }) => `${x},${y}`).join(" ");
  return (
    <>
      <polygon points={points} fill="none" stroke="#fff" strokeWidth="3.5" />
      <polygon
        points={points}
        fill="none"
        stroke="var(--color-chalk)"
        strokeWidth="1.5"
        strokeDasharray={dashed ? "7 4" : undefined}
      />
    </>
  );
}

/** Room that a name needs along its side, CSS px per letter. */
const LETTER_PX = 7.5;

/** Beside the middle of a side, outside, turned with it but never upside down; left out where the side is shorter than the name. */
function SideName({ corners, side, text }: { corners: readonly Place[]; side: number; text: string }) {
  const from = corners[side];
  const to = corners[(side + 1) % 4];
  if (!from || !to) return null;
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  if (length < text.length * LETTER_PX + 40) return null;
  const at = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 };
  const out = { x: (to.y - from.y) / length, y: -(to.x - from.x) / length };
  const along = (Math.atan2(to.y - from.y, to.x - from.x) * 180) / Math.PI;
  const upright = along > 90 || along <= -90 ? along + 180 : along;
  const shown = upright === along ? text : text.replace("grain →", "← grain");
  return (
    <text
      transform={`translate(${at.x + out.x * 16} ${at.y + out.y * 16}) rotate(${upright})`}
      textAnchor="middle"
      dominantBaseline="central"
      className="measure text-sm"
      fill="var(--color-chalk)"
      stroke="#fff"
      strokeWidth="4"
      paintOrder="stroke"
    >
      {shown}
    </text>
  );
}

/** From a corner to the middle of its number, CSS px: clear of the ring around a handle in focus, which is 44 px across and 4 px off. */
const NUMBER_PX = 36;

/** Outside of its corner, and still in the frame when the corner is at its rim. */
function CornerNumber({ at, away, frame, text }: { at: Place; away: Place; frame: Size; text: string }) {
  const distance = Math.hypot(at.x - away.x, at.y - away.y) || 1;
  const inFrame = (value: number, corner: number, room: number) =>
    corner >= 0 && corner <= room ? Math.min(Math.max(value, 11), room - 11) : value;
  const x = inFrame(at.x + ((at.x - away.x) / distance) * NUMBER_PX, at.x, frame.width);
  const y = inFrame(at.y + ((at.y - away.y) / distance) * NUMBER_PX, at.y, frame.height);
  return (
    <>
      <rect x={x - 9} y={y - 10} width="18" height="20" rx="3" fill="var(--color-chalk)" stroke="#fff" />
      <text x={x} y={y + 1} textAnchor="middle" dominantBaseline="central" className="measure text-sm" fill="#fff">
        {text}
      </text>
    </>
  );
}

function Distance({ from, to }: { from: Place; to: Place }) {
  const d = `M${from.x} ${from.y}L${to.x} ${to.y}`;
  return (
    <>
      <path d={d} stroke="var(--color-graphite)" strokeWidth="5" />
      <path d={d} stroke="var(--color-tape)" strokeWidth="3" />
    </>
  );
}
