/** Puts into words what a search for wood weighs, finds and leaves out. */
import { type LengthStyle, type PartName, printLength, type Um } from "@/lib/layout";
import type { LeftOut } from "@/lib/schemas/wood-search";

export const partWords: Readonly<Record<PartName, { readonly name: string; readonly means: string }>> = {
  match: { name: "Match at the seams", means: "How alike the edges look where pieces meet." },
  step: { name: "Step at the seams", means: "How little grain lines miss each other there." },
  symmetry: { name: "Symmetry", means: "How well the figure mirrors about the middle of the face." },
  clear: { name: "Distance to keep-clear", means: "Room to the nearest knot or flaw, up to 30 mm." },
  rest: { name: "What is left", means: "The largest usable rectangle left of the board." },
  stock: { name: "Old and cheap first", means: "How long the board has lain and what it cost." },
};

/** As a whole number of hundredths. */
export const shareFigure = (share: number): string => String(Math.round(share * 100));

const lacking: Readonly<Record<"too-thin" | "too-thick" | "too-short" | "too-narrow", string>> = {
  "too-thin": "too thin by",
  "too-thick": "too thick by",
  "too-short": "too short by",
  "too-narrow": "too narrow by",
};

const obstacles = {
  board: "the edge of the board",
  "keep-clear": "keep-clear areas",
  "spoken-for": "pieces of other faces",
  "other-pieces": "other pieces of this face",
} as const;

export function leftOutWords(reason: LeftOut, style: LengthStyle): string {
  switch (reason.reason) {
    case "species":
      return `it is ${reason.has}`;
    case "too-thin":
    case "too-thick":
    case "too-short":
    case "too-narrow":
      return `${lacking[reason.reason]} ${print(reason.by, style)}`;
    case "held":
      return "belongs to another cut order";
    case "in-blank":
      return "glued into a blank";
    case "no-picture":
      return "has no straightened picture";
    case "no-place":
      return `no place: ${reason.obstacles.map((obstacle) => obstacles[obstacle]).join(" and ")} in the way`;
  }
}

const print = (length: Um, style: LengthStyle) => printLength(length, style);
