/** From what is known of a face over the wire to what the core works its movement out from; for the table and for paper alike. */
import {
  type FaceLayout,
  knownSpecies,
  type MovementRequest,
  noWoodChoice,
  type Species,
  type StockId,
  type WoodOfBoard,
  woodOfBoard,
  yearlyMoisture,
} from "@/lib/layout";
import type { FaceMovementFacts } from "./movement";
import { speciesOf } from "./species";

export interface FaceWoods {
  /** The shop's own first: a name of theirs is meant before one of the table's. */
  readonly species: readonly Species[];
  readonly byBoard: ReadonlyMap<StockId, WoodOfBoard>;
}

export function faceWoods({ boards, choices, ownSpecies }: FaceMovementFacts): FaceWoods {
  const species = [...ownSpecies.map(speciesOf), ...knownSpecies];
  const byBoard = new Map(
    boards.map((board) => {
      const facts = { species: board.species, cut: board.cut, moisture: board.reading?.percent ?? null };
      return [board.boardId, woodOfBoard(facts, choices.woods[board.boardId] ?? noWoodChoice, species)] as const;
    }),
  );
  return { species, byBoard };
}

export function movementRequest(layout: FaceLayout, facts: FaceMovementFacts, woods = faceWoods(facts)): MovementRequest {
  const { choices, climate, leastGap, moistureLimit } = facts;
  return {
    layout,
    woods: new Map([...woods.byBoard].map(([boardId, { wood }]) => [boardId, wood])),
    surround: choices.surround,
    around: choices.around,
    year: yearlyMoisture(climate),
    leastGap,
    moistureLimit,
  };
}
