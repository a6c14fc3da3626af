/** What cutting on means for the fronts still to be cut, in words: "Front 4 is 0.6 mm short across; sliding it 0.8 mm up saves it." */
import { type Edge, type LengthStyle, printLength, type Rescue, type Trouble, type TroubleFact, type Um, um } from "@/lib/layout";
import { capital } from "./capital";
import { edgeNames } from "./edge-name";
import { labelRanges, partName } from "./part-name";

type Print = (length: Um) => string;
type Change = Rescue["changes"][number];

/** What is wrong and the rescue chosen for it. */
export function troubleSentence(trouble: Trouble, style: LengthStyle): string {
  const rescue = trouble.rescues.find(({ kind }) => kind === trouble.chosen);
  const facts = factSentences(trouble, style).join("; ");
  return rescue ? `${facts}; ${rescueWords(rescue, style)}.` : `${facts}.`;
}

/** What is wrong, each as a sentence without its full stop; fronts with which the same is wrong are named together. */
export function factSentences({ facts, missing }: Pick<Trouble, "facts" | "missing">, style: LengthStyle): string[] {
  const print: Print = (length) => printLength(length, style);
  const said = new Map<string, string[]>();
  for (const fact of facts) {
    const { labels, rest } = factWords(fact, print);
    said.set(rest, [...(said.get(rest) ?? []), ...labels]);
  }
  const sentences = [...said].map(([rest, labels]) => sentenceOf([...new Set(labels)], rest));
  const [along, across] = [missing.along, missing.across];
  const lacking = [
    ...(along > 0 ? [`${print(along)} is missing along the grain`] : []),
    ...(across > 0 ? [`${print(across)} is missing across it`] : []),
  ];
  // Where one front is short, it is said already by how much.
  const alone = facts.length === 1 && facts[0]?.kind === "short";
  return [...sentences, ...(alone ? [] : lacking)];
}

interface FactWords {
  readonly labels: readonly string[];
  /** "is|are": of one front or of several. */
  readonly rest: string;
}

function factWords(fact: TroubleFact, print: Print): FactWords {
  switch (fact.kind) {
    case "short": {
      const [along] = isEnd(fact.edge) ? ["in length"] : ["across"];
      return { labels: [fact.piece.label], rest: `is|are ${print(fact.by)} short ${along}, at the ${edgeNames[fact.edge]}` };
    }
    case "too-close":
      return { labels: fact.pieces.map(({ label }) => label), rest: `lies|lie ${print(fact.by)} too close for the blade` };
    case "no-cut":
      return { labels: fact.pieces.map(({ label }) => label), rest: "can no longer be parted by straight cuts" };
    case "bad-wood":
      return { labels: [fact.piece.label], rest: "lies|lie on wood that cannot be used" };
    case "spoiled":
      return { labels: [fact.piece.label], rest: "is|are spoiled" };
    case "no-wood":
      return { labels: [fact.piece.label], rest: "has|have no wood left where it was to be cut" };
  }
}

function sentenceOf(labels: readonly string[], rest: string): string {
  const several = labels.length > 1;
  const verb = rest.replace(/^(\w+)\|(\w+)/, several ? "$2" : "$1");
  return `${several ? "Fronts" : "Front"} ${labelRanges(labels)} ${verb}`;
}

const isEnd = (edge: Edge): boolean => edge === "left" || edge === "right";

/** The rescue as the second half of a sentence. */
export function rescueWords(rescue: Rescue, style: LengthStyle): string {
  const print: Print = (length) => printLength(length, style);
  const { changes, leftOut } = rescue;
  const slid = changes.filter(({ by, from }) => !from && (by.x !== 0 || by.y !== 0));
  const them = changes.length > 1 ? "them" : "it";
  switch (rescue.kind) {
    case "slide":
      return `sliding ${slideWords(slid, print)} saves ${them}`;
    case "less-clean-up":
      return `cleaning ${namesOf(changes.filter(({ cleanUp }) => cleanUp.length > 0))} up ${lessWords(changes, print)} less saves ${them}`;
    case "narrower":
    case "smaller":
      return `leaving ${smallerWords(changes, print)} saves ${them}`;
    case "elsewhere":
      return `${possibleWords(changes)}${slid.length > 0 ? `, with ${slideWords(slid, print)}` : ""}`;
    case "other-board":
      return `another board is needed for ${frontsOf(leftOut.map(({ label }) => label))}`;
  }
}

/** The rescue as something to choose. */
export function rescueTitle(rescue: Rescue, style: LengthStyle): string {
  const print: Print = (length) => printLength(length, style);
  const { changes, leftOut } = rescue;
  const slid = changes.filter(({ by, from }) => !from && (by.x !== 0 || by.y !== 0));
  switch (rescue.kind) {
    case "slide":
      return `Slide ${slideWords(slid, print)}`;
    case "less-clean-up":
      return `Clean ${namesOf(changes.filter(({ cleanUp }) => cleanUp.length > 0))} up ${lessWords(changes, print)} less`;
    case "narrower":
    case "smaller":
      return `Leave ${smallerWords(changes, print)}`;
    case "elsewhere":
      return capital(elsewhereWords(changes));
    case "other-board":
      return `Leave ${frontsOf(leftOut.map(({ label }) => label))} out, for another board`;
  }
}

function slideWords(slid: readonly Change[], print: Print): string {
  const [one, second] = slid;
  if (one && !second) return `front ${one.label} ${wayWords(one, print)}`;
  if (one && slid.every(({ by }) => by.x === one.by.x && by.y === one.by.y)) {
    return `${frontsOf(slid.map(({ label }) => label))} ${wayWords(one, print)}`;
  }
  const most = um(Math.max(0, ...slid.map(({ by }) => Math.max(Math.abs(by.x), Math.abs(by.y)))));
  return `${frontsOf(slid.map(({ label }) => label))} by up to ${print(most)}`;
}

/** "0.8 mm to the right and 0.2 mm up": as the board lies in its picture. */
export function wayWords({ by }: Pick<Change, "by">, print: Print): string {
  const ways = [
    ...(by.x === 0 ? [] : [`${print(um(Math.abs(by.x)))} to the ${by.x < 0 ? "left" : "right"}`]),
    ...(by.y === 0 ? [] : [`${print(um(Math.abs(by.y)))} ${by.y < 0 ? "up" : "down"}`]),
  ];
  return ways.join(" and ");
}

function lessWords(changes: readonly Change[], print: Print): string {
  const less = changes.flatMap(({ cleanUp }) => cleanUp.map(({ planned, left }) => planned - left));
  const [most, least] = [Math.max(0, ...less), Math.min(...less)];
  return `${most === least ? "" : "up to "}${print(um(most))}`;
}

function smallerWords(changes: readonly Change[], print: Print): string {
  const smaller = changes.filter(({ smaller: { along, across } }) => along > 0 || across > 0);
  return smaller
    .map(({ label, smaller: { along, across } }) => {
      const sizes = [...(along > 0 ? [`${print(along)} shorter`] : []), ...(across > 0 ? [`${print(across)} narrower`] : [])];
      return `front ${label} ${sizes.join(" and ")}`;
    })
    .join(", ");
}

function elsewhereWords(changes: readonly Change[]): string {
  return fromParts(changes)
    .map(({ labels, part }) => `cut ${frontsOf(labels)} from ${part} instead`)
    .join(", ");
}

function possibleWords(changes: readonly Change[]): string {
  return fromParts(changes)
    .map(({ labels, part }) => `${frontsOf(labels)} can be cut from ${part}`)
    .join(", ");
}

/** Fronts that are cut from other wood than before, by the part they come from. */
function fromParts(changes: readonly Change[]): { readonly labels: readonly string[]; readonly part: string }[] {
  const anew = changes.flatMap(({ label, from }) => (from ? [{ label, part: partName(from) }] : []));
  const parts = [...new Set(anew.map(({ part }) => part))];
  return parts.map((part) => ({ part, labels: anew.filter((one) => one.part === part).map(({ label }) => label) }));
}

const namesOf = (changes: readonly Change[]): string => frontsOf(changes.map(({ label }) => label));

function frontsOf(labels: readonly string[]): string {
  return `${labels.length > 1 ? "fronts" : "front"} ${labelRanges(labels)}`;
}
