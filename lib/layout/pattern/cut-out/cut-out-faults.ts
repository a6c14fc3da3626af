/** What makes a cut-out mean nothing. */
import { um } from "../../units/um";
import type { CutOutFace } from "../face";
import type { CutOutFault, FaceFault } from "../face-fault";
import { lengthOfRow } from "./cut-out-pieces";
import { bySide } from "./rail-axes";

export function cutOutFaults(face: CutOutFace): FaceFault[] {
  const { strips, rows } = face;
  if (rows.length === 0) return [{ fault: "empty-face" }];
  const faults: FaceFault[] = [];
  if (strips.length !== rows.length + 1) faults.push({ fault: "strip-count", strips: strips.length, rows: rows.length });
  strips.forEach((strip, index) => {
    if (!(strip > 0)) faults.push({ fault: "strip-not-positive", strip: index });
  });
  if (!Object.values(face.gap).every((gap) => gap >= 0)) faults.push({ fault: "negative-length", where: "gap" });
  if (!(face.fitting >= 0)) faults.push({ fault: "negative-length", where: "fitting" });
  return [...faults, ...rows.flatMap((_, row) => faultsOfRow(face, row))];
}

function faultsOfRow(face: CutOutFace, row: number): CutOutFault[] {
  const { height, parts } = face.rows[row] ?? { height: 0, parts: [] };
  const faults: CutOutFault[] = [];
  if (!(height > 0)) faults.push({ fault: "row-not-positive", row });
  if (parts[0]?.kind !== "fixed" || parts.at(-1)?.kind !== "fixed") faults.push({ fault: "row-ends-open", row });
  const gaps = bySide(face.gap, face.grain);
  const across = height - gaps.above - gaps.below;
  parts.forEach(({ kind, width }, part) => {
    if (!(width > 0)) faults.push({ fault: "part-not-positive", row, part });
    else if (kind === "fixed" && parts[part - 1]?.kind === "fixed") faults.push({ fault: "fixed-beside-fixed", row, part });
    else if (kind === "front" && !(Math.min(width - gaps.near - gaps.far, across) > 0))
      faults.push({ fault: "no-front", row, part });
  });
  const by = lengthOfRow(face, row) - lengthOfRow(face, 0);
  if (by !== 0) faults.push({ fault: "row-length-differs", row, by: um(by) });
  return faults;
}
