"use client";
/** Sizes worked out from an opening: how many fronts, the gaps around and between them, and how they grow. */
import { useState } from "react";
import { type AxisDraft, axisSizes, startingDraft } from "@/components/face/axis-draft";
import { AxisForm } from "@/components/face/axis-form";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { Modal } from "@/components/ui/modal";
import { changeSizes } from "@/lib/editor/commands/change-sizes";
import { type GridFace, um } from "@/lib/layout";
import { useTableContext } from "./table-context";

interface OpeningDialogProps {
  face: GridFace;
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

export function OpeningDialog({ face, open, onOpenChange }: OpeningDialogProps) {
  return (
    <Modal
      open={open}
      onOpenChange={onOpenChange}
      title="Sizes from an opening"
      lead="The anchor stays where it is in the wood; the other fronts move away from it or towards it."
    >
      {open && <OpeningForm face={face} onDone={() => onOpenChange(false)} />}
    </Modal>
  );
}

function OpeningForm({ face, onDone }: { face: GridFace; onDone: () => void }) {
  const { editor } = useTableContext();
  const { units } = useUnits();
  const [columns, setColumns] = useState(() => draftOf(face, "columns", units));
  const [rows, setRows] = useState(() => draftOf(face, "rows", units));
  const across = axisSizes(columns);
  const down = axisSizes(rows);
  return (
    <div className="flex flex-col gap-4">
      <AxisForm axis="columns" draft={columns} onChange={setColumns} />
      <AxisForm axis="rows" draft={rows} onChange={setRows} />
      <Button
        kind="primary"
        disabled={!across.ok || !down.ok}
        onClick={() => {
          if (!across.ok || !down.ok) return;
          const sizes = { columns: across.sizes, columnGaps: across.gaps, rows: down.sizes, rowGaps: down.gaps };
          editor.run((document) => changeSizes(document, { ...face, ...sizes }));
          onDone();
        }}
      >
        Use these sizes
      </Button>
    </div>
  );
}

/** Starts from the opening that the present sizes would fill with their gap all round. */
function draftOf(face: GridFace, axis: "columns" | "rows", units: "mm" | "inch"): AxisDraft {
  const start = startingDraft(axis, units);
  const sizes = face[axis];
  const gaps = axis === "columns" ? face.columnGaps : face.rowGaps;
  const gap = gaps[0] ?? start.gap;
  const total = [...sizes, ...gaps].reduce((sum, length) => sum + length, 0);
  return { ...start, count: sizes.length, gap, outerBefore: gap, outerAfter: gap, opening: um(total + 2 * gap) };
}
