/** What is written about a blank, from its boards. */
import "server-only";
import type { BoardFields } from "@/db/queries/board";
import type { ComposedBlank } from "@/lib/layout";
import type { PlanBlank } from "@/lib/schemas/blank";
import type { FreeMember } from "./free-members";

/** Longer than this no species is written. */
const longestSpecies = 80;

/** Cost and moisture stay with the boards: a blank's own moisture is measured once it is glued. */
export function blankFields(
  members: readonly FreeMember[],
  { length, width, thickness }: ComposedBlank,
  { place, note }: Pick<PlanBlank, "place" | "note">,
): BoardFields {
  const boards = members.map(({ board }) => board);
  const species = [...new Set(boards.map((board) => board.species))].join(" and ");
  const [first] = boards;
  if (!first) throw new Error("a blank has no boards");
  const same = <T>(value: T, of: (board: (typeof boards)[number]) => T) => boards.every((board) => of(board) === value);
  return {
    kind: "blank",
    state: "rack",
    species: species.slice(0, longestSpecies),
    cut: first.cut,
    nominalQuarters: same(first.nominalQuarters, (board) => board.nominalQuarters) ? first.nominalQuarters : null,
    thickness,
    length,
    width,
    place,
    source: "",
    costMinor: null,
    note,
  };
}
