/** What other faces take of the boards on the table, by its id. */
import type { WoodOf } from "@/lib/schemas/spoken-for";
import type { TableBoard } from "../table-board";

export function woodOfBoards(boards: readonly Pick<TableBoard, "spokenFor">[]): WoodOf {
  const byId = new Map(boards.flatMap(({ spokenFor }) => spokenFor.map((wood) => [wood.id, wood] as const)));
  return (id) => byId.get(id);
}
