/** The steps that follow from the pattern of a face, in words. */
import { type LengthStyle, printLength, type Um, um } from "@/lib/layout";
import type { FaceStepBody } from "@/lib/schemas/face-steps";
import type { RunWork, SetBack } from "@/lib/schemas/face-work";
import { bevelCautions, gluingCautions, resawCautions } from "./caution";
import { labelRanges, sizeFigures } from "./part-name";
import type { StepWords } from "./step-words";

const bare = { notes: [], cautions: [], from: null, measure: null, setting: null, gives: [] } as const;

export function faceStepWords(step: FaceStepBody, style: LengthStyle): StepWords {
  switch (step.kind) {
    case "gauge-lines":
      return {
        ...bare,
        verb: "Draw",
        rest: "lines across every cut to come",
        notes: [
          "one line along the rail over all crosscuts, one across it over all rips, with a knife or a fine pencil",
          "parts are glued back by how far these lines miss each other",
        ],
      };
    case "resaw":
      return resawWords(step, style);
    case "bevel":
      return bevelWords(step, style);
    case "set-back":
      return setBackWords(step.work, step.row, style);
    case "fit":
      return fitWords(step.work, step.row, style);
  }
}

function resawWords({ work }: Extract<FaceStepBody, { kind: "resaw" }>, style: LengthStyle): StepWords {
  const [first, second] = work.labels;
  return {
    ...bare,
    verb: "Resaw",
    rest: `blank ${work.labels.join(" and ")} through its thickness`,
    notes: [
      `blank ${printLength(work.roughThickness, style)} thick, kerf ${printLength(work.kerf, style)}; both sawn faces show`,
      `plane ${printLength(work.planing, style)} off every face, to ${printLength(work.leafThickness, style)}`,
      `the leaf from behind becomes ${first}, the leaf of the photographed face ${second}; they open ${work.opens === "side" ? "beside each other" : "one over the other"}, triangle closed`,
    ],
    cautions: resawCautions,
    gives: work.labels.map((label) => ({ word: "leaf", label, size: `${printLength(work.leafThickness, style)} thick` })),
  };
}

function bevelWords({ work, corner }: Extract<FaceStepBody, { kind: "bevel" }>, style: LengthStyle): StepWords {
  const angle = `${Number(corner.bevelDeg.toFixed(2))}°`;
  const both = `${corner.before} and ${corner.after}`;
  return {
    ...bare,
    verb: "Bevel",
    rest: `${both}, ${angle} from square`,
    notes: [
      bevelNote(corner),
      innerNote(work, corner, style),
      "try the setting on scrap first: two bevels have to close to the corner",
    ],
    cautions: bevelCautions,
  };
}

function bevelNote({ before, after, way }: RunWork["corners"][number]): string {
  if (way === "oneBevel") return `the bevel that parted them serves ${before}; turn ${after} and cut it again from its show edge`;
  if (way === null) return `the ends of the run, where ${before} meets ${after}: bevel each up to its show edge`;
  return "bevel each up to its show edge, which stays as it is";
}

function innerNote({ sides }: RunWork, { before, after }: RunWork["corners"][number], style: LengthStyle): string {
  const inner = [before, after].flatMap((label) => {
    const side = sides.find((one) => one.label === label);
    return side ? [`${label} ${printLength(side.show, style)} on the show face, ${printLength(side.inner, style)} inside`] : [];
  });
  return inner.join("; ");
}

function setBackWords(work: SetBack, row: number, style: LengthStyle): StepWords {
  const strips = work.strips.slice(row, row + 2).map(({ label }) => label);
  const fixed = work.rows[row]?.fixed ?? [];
  const last = row === work.rows.length - 1;
  return {
    ...bare,
    verb: "Glue",
    rest: `parts ${labelRanges(fixed.map(({ label }) => label))} between strips ${strips.join(" and ")}`,
    notes: [
      ...fixed.map(({ label, shift }) => `part ${label}: ${shiftWords(shift, work.grain, style)}`),
      "no glue in the openings; scrape them clean before it sets",
    ],
    cautions: gluingCautions,
    gives: last ? [{ word: "rail", label: null, size: sizeFigures(work.outside, style) }] : [],
  };
}

/** Against the line drawn across the cuts. */
function shiftWords(shift: { along: Um; across: Um } | null, grain: SetBack["grain"], style: LengthStyle): string {
  if (shift === null) return "not from this run of figure: place it by its opening";
  if (shift.along === 0) return "its line meets that of the strips";
  const [on, back] = grain === "horizontal" ? ["right", "left"] : ["down", "up"];
  return `its line ${printLength(um(Math.abs(shift.along)), style)} ${shift.along > 0 ? on : back} of that of the strips`;
}

function fitWords(work: SetBack, row: number, style: LengthStyle): StepWords {
  const fronts = work.rows[row]?.fronts ?? [];
  return {
    ...bare,
    verb: "Fit",
    rest: `${fronts.length === 1 ? "front" : "fronts"} ${labelRanges(fronts.map(({ label }) => label))} to ${fronts.length === 1 ? "its opening" : "their openings"}`,
    notes: ["measure each opening first: it decides, not the figure here"],
    gives: fronts.map(({ label, opening, finished }) => ({
      word: `opening ${sizeFigures(opening, style)}`,
      label,
      size: sizeFigures(finished, style),
    })),
  };
}
