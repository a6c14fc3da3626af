"use client";
import { SelectField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { NumberField } from "@/components/ui/number-field";
import { um, type WrapCorner } from "@/lib/layout";

interface Props {
  corner: WrapCorner;
  onChange: (corner: WrapCorner) => void;
}

type Made = "squareThenBevels" | "oneBevel" | "before" | "after" | "gap";

const made: readonly { readonly value: Made; readonly label: string }[] = [
  { value: "squareThenBevels", label: "Mitre: a square cut, then a bevel on each" },
  { value: "oneBevel", label: "Mitre: one bevel cut, the second end cut again" },
  { value: "before", label: "Butt: the side before covers" },
  { value: "after", label: "Butt: the side after covers" },
  { value: "gap", label: "Open gap" },
];

/** How one corner is made, and by how much the run turns there. */
export function CornerFields({ corner, onChange }: Props) {
  return (
    <div className="flex flex-col gap-3">
      <SelectField
        label="How it is made"
        value={madeOf(corner)}
        onChange={(event) => onChange(cornerMade(event.target.value as Made, corner))}
      >
        {made.map(({ value, label }) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </SelectField>
      <div className="grid grid-cols-2 gap-3">
        <NumberField
          label="The run turns by, degrees"
          hint="A square corner: 90"
          value={corner.turnDeg}
          min={1}
          max={179}
          digits={2}
          required
          onChange={(turnDeg) => turnDeg !== null && onChange({ ...corner, turnDeg })}
        />
        {corner.kind === "gap" && (
          <LengthField
            label="Gap"
            required
            value={corner.gap}
            onChange={(gap) => gap !== null && gap >= 0 && onChange({ ...corner, gap })}
          />
        )}
      </div>
    </div>
  );
}

function madeOf(corner: WrapCorner): Made {
  if (corner.kind === "mitre") return corner.parting;
  return corner.kind === "butt" ? corner.covers : "gap";
}

function cornerMade(kind: Made, { turnDeg }: WrapCorner): WrapCorner {
  if (kind === "gap") return { kind: "gap", turnDeg, gap: um(2_000) };
  if (kind === "before" || kind === "after") return { kind: "butt", turnDeg, covers: kind };
  return { kind: "mitre", turnDeg, parting: kind };
}
