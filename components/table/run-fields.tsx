"use client";
/** Sizes of a run round corners: its sides, and each corner by itself. */
import { CornerFields } from "@/components/face/corner-fields";
import { Button } from "@/components/ui/button";
import { LengthField } from "@/components/ui/length-field";
import { changeSizes } from "@/lib/editor/commands/change-sizes";
import type { WrapCorner, WrapFace } from "@/lib/layout";
import { useTableContext } from "./table-context";

export function RunFields({ face }: { face: WrapFace }) {
  const { editor } = useTableContext();
  const { sides, corners, closed } = face;
  const change = (part: Partial<WrapFace>) => editor.run((document) => changeSizes(document, { ...face, ...part }));
  const withSides = (next: WrapFace["sides"]) => change({ sides: next, corners: cornersFor(next.length, closed, corners) });
  return (
    <fieldset className="flex flex-col gap-3" disabled={!editor.mayChange}>
      <div className="grid grid-cols-2 gap-2">
        {sides.map((side, index) => (
          <LengthField
            // biome-ignore lint/suspicious/noArrayIndexKey: a side is its place in the run
            key={index}
            label={`Side ${index + 1}`}
            required
            value={side}
            onChange={(length) => length !== null && length > 0 && change({ sides: sides.with(index, length) })}
          />
        ))}
        <LengthField
          label="Height"
          required
          value={face.height}
          onChange={(height) => height !== null && height > 0 && change({ height })}
        />
        <LengthField
          label="Thickness"
          required
          value={face.thickness}
          onChange={(thickness) => thickness !== null && thickness > 0 && change({ thickness })}
        />
      </div>
      <div className="flex flex-wrap gap-2">
        <Button size="small" onClick={() => withSides([...sides, sides.at(-1) ?? face.height])}>
          Add a side
        </Button>
        {sides.length > 2 && (
          <Button size="small" onClick={() => withSides(sides.slice(0, -1))}>
            Remove the last side
          </Button>
        )}
      </div>
      <label className="flex min-h-8 items-center gap-2 text-sm">
        <input
          type="checkbox"
          className="size-5 accent-chalk"
          checked={closed}
          onChange={({ target: { checked } }) => change({ closed: checked, corners: cornersFor(sides.length, checked, corners) })}
        />
        The run closes on itself
      </label>
      {corners.map((corner, index) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: a corner is its place in the run
        <fieldset key={index} className="border-l-2 border-rule pl-3">
          <legend className="mb-1 text-sm font-semibold">
            Corner of {index + 1} and {index + 1 < sides.length ? index + 2 : 1}
          </legend>
          <CornerFields corner={corner} onChange={(next) => change({ corners: corners.with(index, next) })} />
        </fieldset>
      ))}
    </fieldset>
  );
}

const square: WrapCorner = { kind: "mitre", turnDeg: 90, parting: "squareThenBevels" };

/** As many corners as the run then has; new ones are like the last. */
function cornersFor(sides: number, closed: boolean, before: readonly WrapCorner[]): WrapCorner[] {
  const count = closed ? sides : sides - 1;
  return Array.from({ length: count }, (_, index) => before[index] ?? before.at(-1) ?? square);
}
