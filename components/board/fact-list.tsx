"use client";
import type { ReactNode } from "react";
import { useUnits } from "@/components/shell/units";
import type { Board } from "@/lib/schemas/board";
import { boardFeetText, cutNames, quartersText, stateNames, trueEdgeNames, volumeText } from "./board-words";
import { moneyText } from "./money";

/** Everything written about a board, to read. */
export function FactList({ board }: { board: Board }) {
  const { print, currency } = useUnits();
  const measured = board.length > 0 && board.width > 0;
  const size = measured ? `${print(board.length)} × ${print(board.width)}` : "not measured yet";
  return (
    <dl className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-6 gap-y-1.5">
      <Fact name="Species">
        {board.species}, {cutNames[board.cut]}
      </Fact>
      <Fact name="Size" measure>
        {size}
      </Fact>
      <Fact name="Thickness" measure>
        {[print(board.thickness), board.nominalQuarters !== null && `sold as ${quartersText(board.nominalQuarters)}`]
          .filter(Boolean)
          .join(", ")}
      </Fact>
      {measured && (
        <>
          <Fact name="Board feet, by the lumber rule" measure>
            {boardFeetText(board.boardFeet)}
          </Fact>
          <Fact name="Exact volume" measure>
            {volumeText(board.volumeBoardFeet)}
          </Fact>
        </>
      )}
      <Fact name="True long edges">{trueEdgeNames[board.trueEdges]}</Fact>
      {board.toBeFlattened && <Fact name="Flat">to be flattened</Fact>}
      {board.place && <Fact name="Place">{board.place}</Fact>}
      {board.source && <Fact name="Source">{board.source}</Fact>}
      {board.costMinor !== null && (
        <Fact name="Cost" measure>
          {moneyText(board.costMinor, currency)}
        </Fact>
      )}
      <Fact name="State">{stateNames[board.state]}</Fact>
      {board.note && (
        <Fact name="Note">
          <span className="whitespace-pre-line">{board.note}</span>
        </Fact>
      )}
    </dl>
  );
}

function Fact({ name, measure = false, children }: { name: string; measure?: boolean; children: ReactNode }) {
  return (
    <>
      <dt className="text-sm leading-6 text-pencil">{name}</dt>
      <dd className={measure ? "measure" : "break-words"}>{children}</dd>
    </>
  );
}
