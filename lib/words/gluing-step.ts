/** The steps that make a blank of its boards, in words. Edges are named as the boards lie once they are laid out. */
import { type LengthStyle, printLength, type Um, um } from "@/lib/layout";
import type { GluingMember } from "@/lib/schemas/gluing";
import type { GluingStep } from "@/lib/schemas/order-steps";
import { gluingCautions, jointingCaution } from "./caution";
import { sizeFigures } from "./part-name";
import type { Gives, StepWords } from "./step-words";

const bare = { notes: [], cautions: [], from: null, measure: null, setting: null, gives: [] } as const;

export function gluingWords(step: GluingStep, style: LengthStyle): StepWords {
  switch (step.kind) {
    case "fetch-member":
      return fetchWords(step.member, step.board.tag);
    case "arrange":
      return {
        ...bare,
        verb: "Lay out",
        rest: `the boards of blank ${step.board.tag}`,
        notes: arrangeNotes(step.members, style),
      };
    case "trim-edge":
      return trimWords(step);
    case "joint":
      return jointWords(step, style);
    case "glue-up":
      return {
        ...bare,
        verb: "Glue up",
        rest: `blank ${step.board.tag} of ${listed(step.members.map(({ tag }) => tag))}`,
        notes: [
          ...step.members.slice(1).map((below, index) => jointNote(step.members[index], below)),
          placesNote(step.members, style),
          "scrape off what is squeezed out before the blank is planed",
        ],
        cautions: gluingCautions,
        gives: [
          {
            word: "",
            label: step.board.tag,
            size: sizeFigures({ width: step.board.length, height: step.board.width }, style),
          },
        ],
      };
  }
}

function fetchWords({ tag, place, species }: GluingMember, blankTag: string): StepWords {
  return {
    ...bare,
    verb: "Fetch",
    rest: `board ${tag}${place && ` from ${place}`}`,
    notes: [`${species}, for blank ${blankTag}`],
  };
}

/** "B-042 (back up, turned end for end)". */
export function memberWords({ tag, side, endForEnd }: Pick<GluingMember, "tag" | "side" | "endForEnd">): string {
  const how = [side === "back" && "back up", endForEnd && "turned end for end"].filter((part) => part !== false);
  return how.length > 0 ? `${tag} (${how.join(", ")})` : tag;
}

function arrangeNotes(members: readonly GluingMember[], style: LengthStyle): string[] {
  return [
    `from the upper edge down: ${members.map(memberWords).join(", ")}`,
    members.some(({ side }) => side === "back") ? "the others face up" : "all face up",
    placesNote(members, style),
    "chalk a triangle across all boards: it tells which edge meets which",
  ];
}

/** Where the left ends lie: flush, or so far in from the one that lies farthest left. */
function placesNote(members: readonly GluingMember[], style: LengthStyle): string {
  if (members.every(({ rect }) => rect.x === 0)) return "left ends flush";
  const places = members.map(({ tag, rect }) =>
    rect.x === 0 ? `${tag} at the left end` : `${tag} ${printLength(rect.x, style)} in`,
  );
  return `left ends: ${places.join(", ")}`;
}

const jointNote = (above: GluingMember | undefined, below: GluingMember) =>
  `lower edge of ${above?.tag ?? ""} to the upper edge of ${below.tag}`;

function trimWords({ member, edge, by }: Extract<GluingStep, { kind: "trim-edge" }>): StepWords {
  return {
    ...bare,
    verb: "Trim",
    rest: `the ${edge} edge of ${member.tag}`,
    notes: ["as it lies; this edge is not glued, it becomes an edge of the blank"],
    from: `${edge} edge`,
    measure: `Take so much off the ${edge} edge`,
    setting: by,
  };
}

function jointWords(
  { joint, above, below, jointing, ready }: Extract<GluingStep, { kind: "joint" }>,
  style: LengthStyle,
): StepWords {
  return {
    ...bare,
    verb: "Joint",
    rest: `the lower edge of ${above.tag} and the upper edge of ${below.tag}`,
    notes: [
      `joint ${joint}, edges as the boards lie`,
      takesNote(above.tag, "lower", above.takes.lower, jointing, style),
      takesNote(below.tag, "upper", below.takes.upper, jointing, style),
      "straight and square, so that they close without force",
    ],
    cautions: [jointingCaution],
    gives: ready.map((member) => givesOf(member, style)),
  };
}

/** What is trimmed is ripped off; the jointer takes the last of it. */
function takesNote(tag: string, edge: "upper" | "lower", takes: Um, jointing: Um, style: LengthStyle): string {
  const figure = (length: number) => printLength(um(length), style);
  const trimmed = takes - jointing;
  const how = trimmed > 0 ? `, of it ${figure(trimmed)} with the saw` : "";
  return `${figure(takes)} off the ${edge} edge of ${tag}${how}`;
}

function givesOf({ tag, rect }: GluingMember, style: LengthStyle): Gives {
  return { word: "", label: tag, size: sizeFigures(rect, style) };
}

/** "B-041, B-042 and B-043". */
function listed(names: readonly string[]): string {
  const last = names.at(-1) ?? "";
  return names.length < 2 ? last : `${names.slice(0, -1).join(", ")} and ${last}`;
}
