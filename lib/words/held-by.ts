/** Which other faces lie on a board of the layout table, in plain words. */
import type { Layout } from "@/lib/schemas/layout";
import type { SpokenForPiece } from "@/lib/schemas/spoken-for";
import { labelRanges } from "./part-name";

type Holder = Layout["boards"][number]["heldBy"][number];

/** `labels`: of the pieces that the face has on the board, as far as they are known. */
export function heldBySentence({ faceTitle, jobTitle, issued, samePicture }: Holder, labels: readonly string[]): string {
  const whose = `${faceTitle} (${jobTitle})`;
  const given = issued ? "issued for cutting" : "laid out, not issued";
  if (!samePicture) {
    const wayOut = "Bring both to the newest picture, or measure on the board.";
    return `${whose} has this board too, ${given}, but on another picture of it: whether the fronts overlap cannot be told. ${wayOut}`;
  }
  if (labels.length === 0) return `${whose} has this board on its table too, with no front on it yet.`;
  const [fronts, lie] = labels.length === 1 ? ["Front", "lies"] : ["Fronts", "lie"];
  return `${fronts} ${labelRanges(labels)} of ${whose} ${lie} on this board too, ${given}.`;
}

/** A piece of another face for those who hear the table. `where` is its place on the board. */
export function spokenForWords({ label, faceTitle, jobTitle, issued }: SpokenForPiece, where: string): string {
  return `Front ${label} of ${faceTitle}, ${jobTitle}, ${where}${issued ? ", issued for cutting" : ""}`;
}
