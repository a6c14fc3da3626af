"use client";
/** One row of a cut-out: its parts along the grain, with what can be done to each. */
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { LengthField } from "@/components/ui/length-field";
import { changeSizes } from "@/lib/editor/commands/change-sizes";
import { movePart, putDivider, takeOutPart } from "@/lib/editor/commands/cut-out";
import { movablePart } from "@/lib/editor/tools/part-drag";
import { type CutOutFace, type CutOutRow, pieceIdAt, piecesOfCutOut, um } from "@/lib/layout";
import { useTableContext } from "./table-context";

/** Of a divider that is put in by hand, to be overwritten. */
const DIVIDER = um(25_000);

export function RailRow({ face, row }: { face: CutOutFace; row: number }) {
  const { editor } = useTableContext();
  const { print } = useUnits();
  const present = face.rows[row];
  if (!present) return null;
  const change = (part: Partial<CutOutRow>) =>
    editor.run((document) => changeSizes(document, { ...face, rows: face.rows.with(row, { ...present, ...part }) }));
  return (
    <fieldset className="flex flex-col gap-2 border-l-2 border-rule pl-3">
      <legend className="text-sm font-semibold">Row {row + 1}</legend>
      <LengthField
        label="Height of the openings"
        required
        value={present.height}
        onChange={(height) => height !== null && height > 0 && change({ height })}
      />
      {present.parts.map(({ kind, width }, part) => {
        const piece = pieceOf(face, row, part);
        const movable = movablePart({ face }, piece);
        const label = piece.slice(1);
        const last = part === present.parts.length - 1;
        const name = kind === "front" ? `Front ${label}, opening` : movable ? `Divider ${label}` : `End ${label}`;
        return (
          <div key={piece} className="flex flex-wrap items-end gap-2">
            <div className="min-w-28 flex-1">
              <LengthField
                label={name}
                required
                value={width}
                onChange={(length) =>
                  length !== null && length > 0 && change({ parts: present.parts.with(part, { kind, width: length }) })
                }
              />
            </div>
            {movable && (
              <>
                <Button
                  size="small"
                  aria-label={`Move divider ${label} back by ${print(um(1_000))}`}
                  onClick={() => editor.run((document) => movePart(document, movable, um(-1_000)), `move ${piece} back`)}
                >
                  ←
                </Button>
                <Button
                  size="small"
                  aria-label={`Move divider ${label} on by ${print(um(1_000))}`}
                  onClick={() => editor.run((document) => movePart(document, movable, um(1_000)), `move ${piece} on`)}
                >
                  →
                </Button>
                <Button
                  size="small"
                  aria-label={`Take out divider ${label}`}
                  onClick={() => editor.run((document) => takeOutPart(document, { row, part }))}
                >
                  Take out
                </Button>
              </>
            )}
            {kind === "front" && !last && (
              <Button
                size="small"
                aria-label={`Put a divider in front ${label}`}
                onClick={() => editor.run((document) => putDivider(document, { row, part }, DIVIDER))}
              >
                Divide
              </Button>
            )}
          </div>
        );
      })}
    </fieldset>
  );
}

function pieceOf(face: CutOutFace, row: number, part: number): string {
  const index = piecesOfCutOut(face).findIndex((piece) => piece.role !== "strip" && piece.row === row && piece.part === part);
  return pieceIdAt(index);
}
