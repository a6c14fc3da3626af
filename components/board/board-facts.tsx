"use client";
import { useUnits } from "@/components/shell/units";
import { type LengthStyle, printedLength } from "@/lib/layout";
import type { BoardRow } from "@/lib/schemas/board";
import { cutNames, quartersText, stateNames } from "./board-words";

/** Tag, the facts one looks for on a rack, and what holds it. */
export function BoardFacts({ board }: { board: BoardRow }) {
  const { print, style } = useUnits();
  const measured = board.length > 0 && board.width > 0;
  return (
    <span className="flex flex-col gap-0.5 text-sm">
      <span className="font-measure text-lg leading-tight font-semibold">{board.tag}</span>
      <span>
        {board.species}, {cutNames[board.cut]}
      </span>
      <span className="flex flex-wrap items-baseline gap-x-3 text-pencil">
        <span className="measure text-base text-graphite">
          {[quartersText(board.nominalQuarters), print(board.thickness)].filter(Boolean).join(", ")}
        </span>
        {board.moisturePercent !== null && (
          <span>
            <span className="measure text-base text-graphite">{board.moisturePercent.toFixed(1)}</span> %
          </span>
        )}
        {board.place && <span>{board.place}</span>}
      </span>
      <span className="measure text-base text-pencil">{measured ? sizeText(board, style) : "not measured yet"}</span>
      <span className="flex flex-wrap gap-1 empty:hidden">
        <BoardBadges board={board} />
      </span>
    </span>
  );
}

/** In mm the unit is said once; an inch mark belongs to every figure. */
function sizeText({ length, width }: Pick<BoardRow, "length" | "width">, style: LengthStyle): string {
  const first = printedLength(length, style);
  return `${style.unit === "mm" ? first.figure : first.text} × ${printedLength(width, style).text}`;
}

const badge = "rounded-sm border px-1.5 text-xs leading-5";

type Badged = Pick<BoardRow, "held" | "state" | "kind" | "inBlank">;

/** Whether there is anything to say beside the facts. */
export const hasBadges = ({ held, state, kind, inBlank }: Badged): boolean =>
  held.length > 0 || state !== "rack" || kind === "blank" || inBlank !== null;

export function BoardBadges({ board }: { board: Badged }) {
  const jobs = [...new Set(board.held.map(({ jobTitle }) => jobTitle))];
  return (
    <>
      {board.kind === "blank" && <span className={`${badge} border-line bg-sheet text-graphite`}>blank</span>}
      {board.inBlank && <span className={`${badge} border-chalk bg-sheet text-chalk`}>in blank {board.inBlank.tag}</span>}
      {jobs.map((title) => (
        <span key={title} className={`${badge} border-chalk bg-sheet text-chalk`}>
          held, {title}
        </span>
      ))}
      {board.state !== "rack" && <span className={`${badge} border-line bg-sheet text-graphite`}>{stateNames[board.state]}</span>}
    </>
  );
}
