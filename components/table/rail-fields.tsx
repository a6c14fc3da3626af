"use client";
/** Sizes of a cut-out: strips, rows and their parts, the gaps round the fronts. */
import { Fragment } from "react";
import { Button } from "@/components/ui/button";
import { SelectField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { changeSizes } from "@/lib/editor/commands/change-sizes";
import { type CutOutFace, type CutOutRow, type Um, um } from "@/lib/layout";
import { RailRow } from "./rail-row";
import { useTableContext } from "./table-context";

export function RailFields({ face }: { face: CutOutFace }) {
  const { editor } = useTableContext();
  const change = (part: Partial<CutOutFace>) => editor.run((document) => changeSizes(document, { ...face, ...part }));
  const setGap = (edge: keyof CutOutFace["gap"]) => (length: Um | null) =>
    length !== null && length >= 0 && change({ gap: { ...face.gap, [edge]: length } });
  return (
    <fieldset className="flex flex-col gap-4" disabled={!editor.mayChange}>
      {face.strips.map((strip, index) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: a strip is its place
        <Fragment key={index}>
          <LengthField
            label={stripName(index, face.strips.length)}
            required
            value={strip}
            onChange={(length) => length !== null && length > 0 && change({ strips: face.strips.with(index, length) })}
          />
          {index < face.rows.length && <RailRow face={face} row={index} />}
        </Fragment>
      ))}
      <div className="flex flex-wrap gap-2">
        <Button size="small" onClick={() => change(withRowMore(face))}>
          Add a row
        </Button>
        {face.rows.length > 1 && (
          <Button size="small" onClick={() => change({ rows: face.rows.slice(0, -1), strips: face.strips.slice(0, -1) })}>
            Remove the last row
          </Button>
        )}
      </div>
      <fieldset className="grid grid-cols-2 gap-2">
        <legend className="mb-1 text-sm font-semibold">Gaps round each front</legend>
        <LengthField label="Left" required value={face.gap.left} onChange={setGap("left")} />
        <LengthField label="Right" required value={face.gap.right} onChange={setGap("right")} />
        <LengthField label="Top" required value={face.gap.top} onChange={setGap("top")} />
        <LengthField label="Bottom" required value={face.gap.bottom} onChange={setGap("bottom")} />
      </fieldset>
      <LengthField
        label="Fitting"
        hint="Planed off each end of a front, beyond the saw"
        required
        value={face.fitting}
        onChange={(fitting) => fitting !== null && fitting >= 0 && change({ fitting })}
      />
      <SelectField
        label="Edges between strips and rows"
        value={face.rails}
        onChange={(event) => change({ rails: event.target.value === "fromSaw" ? "fromSaw" : "jointed" })}
      >
        <option value="jointed">Jointed before gluing</option>
        <option value="fromSaw">Glued as they come from the saw</option>
      </SelectField>
    </fieldset>
  );
}

function stripName(index: number, count: number): string {
  if (index === 0) return "First strip";
  return index === count - 1 ? "Last strip" : `Strip between rows ${index} and ${index + 1}`;
}

/** One more row like the last, and a strip after it like the last. */
function withRowMore({ rows, strips }: CutOutFace): Pick<CutOutFace, "rows" | "strips"> {
  const last: CutOutRow[] = rows.slice(-1);
  return { rows: [...rows, ...last], strips: [...strips, strips.at(-1) ?? um(30_000)] };
}
