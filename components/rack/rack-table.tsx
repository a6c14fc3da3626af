"use client";
/** The rack as figures: one line a board, units in the headings, every order at a click. */
import Link from "next/link";
import type { ReactNode } from "react";
import { BoardBadges } from "@/components/board/board-facts";
import { boardFeetText, cutNames, quartersText } from "@/components/board/board-words";
import { moneyText } from "@/components/board/money";
import { useUnits } from "@/components/shell/units";
import { printedLength, type Um } from "@/lib/layout";
import type { BoardRow, boardSorts } from "@/lib/schemas/board";
import type { RackState } from "./rack-query";

type Sort = (typeof boardSorts)[number];

interface Props {
  boards: readonly BoardRow[];
  state: RackState;
  onChange: (change: Partial<RackState>) => void;
}

export function RackTable({ boards, state, onChange }: Props) {
  const { style, currency } = useUnits();
  const unit = style.unit === "mm" ? "mm" : "in";
  const figure = (length: Um) => (length > 0 ? printedLength(length, style).figure : "–");
  return (
    // A table wider than a phone scrolls in its own box; what can be reached in it brings it along for the keyboard.
    <section className="overflow-x-auto px-4 md:px-5" aria-label="Boards as a table">
      <table className="w-full min-w-[76rem] border-collapse text-sm">
        <thead>
          <tr className="border-b border-line text-left align-baseline">
            <Heading state={state} onChange={onChange} sort="tag" name="Tag" />
            <Heading state={state} onChange={onChange} sort="species" name="Species" />
            <th scope="col" className={plainHead}>
              Cut
            </th>
            <th scope="col" className={`${plainHead} text-right`}>
              Nominal
            </th>
            <Heading state={state} onChange={onChange} sort="thickness" name={`Thick, ${unit}`} right />
            <Heading state={state} onChange={onChange} sort="length" name={`Length, ${unit}`} right />
            <Heading state={state} onChange={onChange} sort="width" name={`Width, ${unit}`} right />
            <th scope="col" className={`${plainHead} text-right`}>
              Board feet, by rule
            </th>
            <Heading state={state} onChange={onChange} sort="moisture" name="Moisture, %" right />
            <Heading state={state} onChange={onChange} sort="place" name="Place" />
            <th scope="col" className={plainHead}>
              Source
            </th>
            <th scope="col" className={`${plainHead} text-right`}>
              Cost
            </th>
            <th scope="col" className={plainHead}>
              Held
            </th>
          </tr>
        </thead>
        <tbody>
          {boards.map((board) => (
            <tr key={board.id} className="border-b border-rule hover:bg-sheet">
              <th scope="row" className="py-1.5 pr-4 text-left">
                <Link
                  href={`/rack/${board.id}`}
                  className="measure inline-flex min-h-6 items-center text-chalk underline-offset-4 hover:underline pointer-coarse:min-h-11"
                >
                  {board.tag}
                </Link>
              </th>
              <td className="pr-4 whitespace-nowrap">{board.species}</td>
              <td className="pr-4">{cutNames[board.cut]}</td>
              <Figure>{quartersText(board.nominalQuarters)}</Figure>
              <Figure>{figure(board.thickness)}</Figure>
              <Figure>{figure(board.length)}</Figure>
              <Figure>{figure(board.width)}</Figure>
              <Figure>{board.length > 0 && board.width > 0 ? boardFeetText(board.boardFeet) : "–"}</Figure>
              <Figure>{board.moisturePercent?.toFixed(1) ?? "–"}</Figure>
              <td className="pr-4">{board.place}</td>
              <td className="pr-4">{board.source}</td>
              <Figure>{board.costMinor === null ? "" : moneyText(board.costMinor, currency)}</Figure>
              <td>
                <span className="flex flex-wrap gap-1">
                  <BoardBadges board={board} />
                </span>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}

const plainHead = "py-2 pr-4 font-semibold";

function Figure({ children }: { children: ReactNode }) {
  return <td className="measure pr-4 text-right text-base whitespace-nowrap">{children}</td>;
}

interface HeadingProps extends Pick<Props, "state" | "onChange"> {
  sort: Sort;
  name: string;
  right?: boolean;
}

/** A heading that sorts; a second click turns the order round. */
function Heading({ state, onChange, sort, name, right = false }: HeadingProps) {
  const here = state.sort === sort;
  const direction = here && state.direction === "up" ? "down" : "up";
  const sorted = state.direction === "up" ? "ascending" : "descending";
  return (
    <th scope="col" aria-sort={here ? sorted : undefined} className={`${plainHead} ${right ? "text-right" : ""}`}>
      <button
        type="button"
        className="min-h-6 font-semibold whitespace-nowrap hover:underline pointer-coarse:min-h-11"
        onClick={() => onChange({ sort, direction })}
      >
        {name}
        <span aria-hidden="true" className="text-chalk">
          {here && (state.direction === "up" ? " ↑" : " ↓")}
        </span>
      </button>
    </th>
  );
}
