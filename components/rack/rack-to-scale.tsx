"use client";
/** Boards of the page drawn to one scale under one tape: what looks longer is longer. */
import Link from "next/link";
import { useRef } from "react";
import { BoardFacts } from "@/components/board/board-facts";
import { BoardStrip } from "@/components/board/board-strip";
import { useSize } from "@/components/picture/use-size";
import { Tape } from "@/components/ui/tape";
import { mmFromUm, type Um, umFromMm } from "@/lib/layout";
import type { BoardRow } from "@/lib/schemas/board";

/** The tape runs on a little past the longest board. */
const overhang = 1.03;
/** On paper before any board has been measured. */
const emptyTapeUm = umFromMm(2400);

const columns = "md:grid md:grid-cols-[15rem_minmax(0,1fr)] md:gap-x-5";

export function RackToScale({ boards, longest }: { boards: readonly BoardRow[]; longest: Um }) {
  const track = useRef<HTMLDivElement>(null);
  const { width } = useSize(track);
  const tapeMm = mmFromUm(longest > 0 ? longest : emptyTapeUm) * overhang;
  return (
    <div className="px-4 md:px-5">
      <div className={`sticky top-0 z-10 -mx-4 bg-paper px-4 md:mx-0 md:px-0 ${columns}`}>
        <div className="hidden md:block" />
        <div ref={track} className="h-[26px] overflow-hidden bg-tape">
          {width > 0 && <Tape lengthUm={umFromMm(tapeMm)} pxPerMm={width / tapeMm} />}
        </div>
      </div>
      <ul>
        {boards.map((board, index) => (
          <li key={board.id} className="border-b border-rule">
            <Link href={`/rack/${board.id}`} className={`block py-3 hover:bg-sheet ${columns} md:items-center`}>
              <BoardFacts board={board} />
              <span className="mt-2 block md:mt-0">
                <span
                  className="block"
                  style={{ width: board.length > 0 ? `${(mmFromUm(board.length) / tapeMm) * 100}%` : "100%" }}
                >
                  <BoardStrip board={board} lazy={index > 5} />
                </span>
              </span>
            </Link>
          </li>
        ))}
      </ul>
    </div>
  );
}
