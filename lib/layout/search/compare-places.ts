/** What a place is better and worse at than another, in the parts that a maker would notice. */
import { type PartName, type Parts, partNames } from "./objective";

/** Differences below a twentieth of the scale are not worth a word. Our own choice. */
export const NOTABLE = 0.05;

export interface PartChange {
  readonly part: PartName;
  /** By how much of the scale 0..1, positive. */
  readonly by: number;
}

export interface PlaceComparison {
  /** Largest difference first. */
  readonly better: readonly PartChange[];
  readonly worse: readonly PartChange[];
}

/** A part that applies to one of the two only is not compared. */
export function comparePlaces(place: Parts, other: Parts): PlaceComparison {
  const changes = partNames.flatMap((part): PartChange[] => {
    const [here, there] = [place[part], other[part]];
    return here === null || there === null ? [] : [{ part, by: here - there }];
  });
  const sorted = changes
    .filter(({ by }) => Math.abs(by) >= NOTABLE)
    .sort((p, q) => Math.abs(q.by) - Math.abs(p.by) || inOrder(p, q));
  return {
    better: sorted.filter(({ by }) => by > 0),
    worse: sorted.filter(({ by }) => by < 0).map(({ part, by }) => ({ part, by: -by })),
  };
}

function inOrder(p: PartChange, q: PartChange): number {
  return partNames.indexOf(p.part) - partNames.indexOf(q.part);
}
