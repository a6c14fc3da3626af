/** What a maker should know before boards are glued up, though nothing stands in the way. */
import { type ComposedBlank, type LengthStyle, printLength, um } from "@/lib/layout";
import type { BoardRow } from "@/lib/schemas/board";

type Joined = Pick<BoardRow, "id" | "tag" | "species" | "thickness" | "moisturePercent">;

/** Boards farther apart in moisture move apart at the joint as they dry. Two points: common practice, no source. */
const MOISTURE_POINTS = 2;

export function blankConcerns(blank: ComposedBlank, boards: readonly Joined[], style: LengthStyle): string[] {
  return [
    ...ofJoints(blank, boards, style),
    ...ofPart(blank),
    ...ofSpecies(boards),
    ...ofMoisture(boards),
    ...ofThickness(boards, style),
  ];
}

function ofJoints({ joints }: ComposedBlank, boards: readonly Joined[], style: LengthStyle): string[] {
  const tagOf = (id: string) => boards.find((board) => board.id === id)?.tag ?? "";
  return joints.flatMap(({ above, below, from, to, soundAlong }) => {
    const meets = um(to - from);
    if (soundAlong >= meets) return [];
    return `The joint of ${tagOf(above)} and ${tagOf(below)} has usable wood on both sides along ${printLength(soundAlong, style)} of ${printLength(meets, style)}. Trim an edge back to sound wood.`;
  });
}

function ofPart({ leftOut }: ComposedBlank): string[] {
  if (leftOut === 0) return [];
  const parts = leftOut === 1 ? "A part of the usable wood hangs" : `${leftOut} parts of the usable wood hang`;
  return [
    `${parts} together with nothing and ${leftOut === 1 ? "is" : "are"} left out of the outline. Trim edges back to sound wood.`,
  ];
}

function ofSpecies(boards: readonly Joined[]): string[] {
  const species = [...new Set(boards.map((board) => board.species))];
  return species.length > 1 ? [`These boards are of different woods: ${species.join(", ")}. They move differently.`] : [];
}

function ofMoisture(boards: readonly Joined[]): string[] {
  const read = boards.flatMap(({ tag, moisturePercent }) => (moisturePercent === null ? [] : { tag, percent: moisturePercent }));
  const sorted = read.toSorted((a, b) => a.percent - b.percent || (a.tag < b.tag ? -1 : 1));
  const [dry, wet] = [sorted[0], sorted.at(-1)];
  if (!dry || !wet || wet.percent - dry.percent <= MOISTURE_POINTS) return [];
  return [
    `${wet.tag} was read at ${wet.percent.toFixed(1)} % moisture, ${dry.tag} at ${dry.percent.toFixed(1)} %. Let them come together before they are glued.`,
  ];
}

function ofThickness(boards: readonly Joined[], style: LengthStyle): string[] {
  const all = boards.map(({ thickness }) => thickness);
  const by = Math.max(...all) - Math.min(...all);
  return by > 0 ? [`The boards differ by ${printLength(um(by), style)} in thickness: flatten the blank to the thinnest.`] : [];
}
