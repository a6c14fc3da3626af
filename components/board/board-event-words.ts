/** One line of a board's story. Details are what the server wrote with the change; what is missing is left out. */
import type { HistoryRow } from "@/lib/schemas/history";

type Row = Pick<HistoryRow, "verb" | "detail">;

export function boardEventWords({ verb, detail }: Row): string {
  switch (verb) {
    case "entered":
      return "Entered into the rack";
    case "changed":
      return `Changed ${changedNames(detail.after)}`;
    case "moisture read":
      return `Moisture read: ${String(detail.percent)} %`;
    case "planned":
      return `Planned as a blank of ${listed(detail.members)}`;
    case "put in blank":
      return `Put into blank ${String(detail.tag)}`;
    case "taken apart":
      return `Taken apart; free again: ${listed(detail.members)}`;
    case "out of blank":
      return `Free again: blank ${String(detail.tag)} was taken apart`;
    case "composed":
      return `Version ${String(detail.version)} composed from the pictures of its boards`;
    case "marked":
      return `Marked a photograph${ofSide(detail)} for version ${String(detail.version)}`;
    case "straightened":
      return `Version ${String(detail.version)}${ofSide(detail)} done${carriedWords(detail)}`;
    case "straightening failed":
      return `Version ${String(detail.version)} failed`;
    case "straightening cancelled":
      return `Version ${String(detail.version)} stopped`;
    case "areas drawn":
      return `Outline and areas drawn on version ${String(detail.version)}`;
    default:
      return verb;
  }
}

const fieldNames: Readonly<Record<string, string>> = {
  nominalQuarters: "nominal thickness",
  costMinor: "cost",
  trueEdges: "true long edges",
  toBeFlattened: "whether it is flat",
};

function changedNames(after: HistoryRow["detail"][string] | undefined): string {
  const names = typeof after === "object" && after !== null ? Object.keys(after) : [];
  return names.length === 0 ? "nothing" : names.map((name) => fieldNames[name] ?? name).join(", ");
}

function carriedWords({ areasFrom, outline, areasKept, areasDropped }: Row["detail"]): string {
  if (typeof areasFrom !== "number") return "";
  const parts = [
    outline === "cut" && "its outline cut to the new size",
    outline === "dropped" && "its outline dropped, which no longer fits",
    typeof areasKept === "number" && areasKept > 0 && areas(areasKept, "kept"),
    typeof areasDropped === "number" && areasDropped > 0 && areas(areasDropped, "dropped because off the board now"),
  ].filter((part) => part !== false);
  if (parts.length === 0 && outline === "kept") return `, with the outline of version ${areasFrom}`;
  return parts.length === 0 ? "" : `, from version ${areasFrom}: ${parts.join("; ")}`;
}

const areas = (count: number, fate: string) => `${count} keep-clear ${count === 1 ? "area" : "areas"} ${fate}`;

/** Rows of earlier versions tell no side: there were pictures of the face only. */
const ofSide = ({ side }: Row["detail"]) => (side === "back" ? " of the back" : "");

function listed(names: unknown): string {
  return Array.isArray(names) ? names.map(String).join(", ") : "its boards";
}
