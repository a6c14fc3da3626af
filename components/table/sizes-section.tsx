"use client";
import { useState } from "react";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { LengthField } from "@/components/ui/length-field";
import { changeSizes } from "@/lib/editor/commands/change-sizes";
import { faceSize, type GridFace, type Um, um } from "@/lib/layout";
import { LeafFields } from "./leaf-fields";
import { OpeningDialog } from "./opening-dialog";
import { PanelSection } from "./panel-section";
import { RailFields } from "./rail-fields";
import { RunFields } from "./run-fields";
import { useEditorState, useTableContext } from "./table-context";

export function SizesSection() {
  const { editor } = useTableContext();
  const { print } = useUnits();
  const face = useEditorState((state) => state.document.layout.face);
  const [asking, setAsking] = useState(false);
  const { width, height } = faceSize(face);
  return (
    <PanelSection title="Sizes" beside={<span className="measure">{`${print(width)} × ${print(height)}`}</span>} open={false}>
      {face.pattern === "cutOut" && <RailFields face={face} />}
      {face.pattern === "wrap" && <RunFields face={face} />}
      {face.pattern === "resawn" && <LeafFields face={face} />}
      {face.pattern === "grid" && (
        <>
          <fieldset className="flex flex-col gap-3" disabled={!editor.mayChange}>
            <AxisFields face={face} axis="columns" />
            <AxisFields face={face} axis="rows" />
            <Button size="small" onClick={() => setAsking(true)}>
              Work out from an opening…
            </Button>
          </fieldset>
          <OpeningDialog face={face} open={asking} onOpenChange={setAsking} />
        </>
      )}
    </PanelSection>
  );
}

const names = {
  columns: { size: "Width", gap: "Gap after", add: "Add a column", remove: "Remove the last column", gaps: "columnGaps" },
  rows: { size: "Height", gap: "Gap below", add: "Add a row", remove: "Remove the last row", gaps: "rowGaps" },
} as const;

function AxisFields({ face, axis }: { face: GridFace; axis: "columns" | "rows" }) {
  const { editor } = useTableContext();
  const name = names[axis];
  const sizes = face[axis];
  const gaps = face[name.gaps];
  const change = (part: Partial<GridFace>) => editor.run((document) => changeSizes(document, { ...face, ...part }));
  const places = sizes.map((size, index) => ({ size, gap: gaps[index], index, key: `${axis} ${index + 1}` }));
  return (
    <div className="flex flex-col gap-2">
      {places.map(({ size, gap, index, key }) => (
        <div key={key} className="grid grid-cols-2 gap-2">
          <LengthField
            label={`${name.size} ${index + 1}`}
            value={size}
            onChange={(length) => length !== null && length > 0 && change({ [axis]: sizes.with(index, length) })}
          />
          {gap !== undefined && (
            <LengthField
              label={`${name.gap} ${index + 1}`}
              value={gap}
              onChange={(length) => length !== null && length >= 0 && change({ [name.gaps]: gaps.with(index, length) })}
            />
          )}
        </div>
      ))}
      <div className="flex gap-2">
        <Button size="small" onClick={() => change(grown(face, axis, name.gaps))}>
          {name.add}
        </Button>
        {sizes.length > 1 && (
          <Button size="small" onClick={() => change({ [axis]: sizes.slice(0, -1), [name.gaps]: gaps.slice(0, -1) })}>
            {name.remove}
          </Button>
        )}
      </div>
    </div>
  );
}

/** One more like the last, with the gap before it like the last gap. */
function grown(face: GridFace, axis: "columns" | "rows", gapsName: "columnGaps" | "rowGaps"): Partial<GridFace> {
  const last: Um = face[axis].at(-1) ?? um(100_000);
  const gap: Um = face[gapsName].at(-1) ?? um(3_000);
  return { [axis]: [...face[axis], last], [gapsName]: [...face[gapsName], gap] };
}
