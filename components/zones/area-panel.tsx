"use client";
import { useEffect, useState } from "react";
import { um } from "@/lib/layout";
import { type KeepClearArea, keepClearKinds } from "@/lib/schemas/zones";
import { Button } from "../ui/button";
import { SelectField, TextField } from "../ui/field";
import { LengthField } from "../ui/length-field";
import { type Ellipse, LEAST_RADIUS } from "./ellipse-edit";
import type { ZonesState } from "./use-zones";
import { kindNames } from "./zone-words";
import { withArea } from "./zones-doc";

/** What the selected area is, and its size in figures. */
export function AreaPanel({ area, zones }: { area: KeepClearArea; zones: ZonesState }) {
  const set = (fields: Partial<KeepClearArea>, key?: string) => zones.change(withArea(zones.doc, { ...area, ...fields }), key);
  return (
    <div className="flex flex-col gap-3 rounded-md border border-chalk p-3">
      <SelectField
        label="What it is"
        value={area.kind}
        onChange={({ target }) => set({ kind: keepClearKinds.find((kind) => kind === target.value) ?? "other" })}
      >
        {keepClearKinds.map((kind) => (
          <option key={kind} value={kind}>
            {kindNames[kind]}
          </option>
        ))}
      </SelectField>
      {area.area.shape === "ellipse" && <EllipseFields ellipse={area.area} onChange={(ellipse) => set({ area: ellipse })} />}
      <TextField
        label="Note"
        maxLength={200}
        value={area.note}
        onChange={({ target }) => set({ note: target.value }, `${area.id} note`)}
      />
      <div className="flex flex-wrap gap-2">
        <Button size="small" onClick={() => zones.select(null)}>
          Done
        </Button>
        <Button size="small" kind="danger" onClick={zones.removeSelected}>
          Remove
        </Button>
      </div>
    </div>
  );
}

function EllipseFields({ ellipse, onChange }: { ellipse: Ellipse; onChange: (ellipse: Ellipse) => void }) {
  const { centre, radiusX, radiusY, turnDeg } = ellipse;
  const radius = (size: number | null) => um(Math.max(LEAST_RADIUS, Math.round((size ?? 0) / 2)));
  return (
    <div className="grid grid-cols-2 gap-3">
      <LengthField
        label="Middle along"
        value={centre.x}
        onChange={(x) => x !== null && onChange({ ...ellipse, centre: { ...centre, x } })}
      />
      <LengthField
        label="Middle across"
        value={centre.y}
        onChange={(y) => y !== null && onChange({ ...ellipse, centre: { ...centre, y } })}
      />
      <LengthField
        label="First size"
        value={um(radiusX * 2)}
        onChange={(size) => size !== null && onChange({ ...ellipse, radiusX: radius(size) })}
      />
      <LengthField
        label="Second size"
        value={um(radiusY * 2)}
        onChange={(size) => size !== null && onChange({ ...ellipse, radiusY: radius(size) })}
      />
      <TurnField turnDeg={turnDeg} onChange={(turned) => onChange({ ...ellipse, turnDeg: turned })} />
    </div>
  );
}

function TurnField({ turnDeg, onChange }: { turnDeg: number; onChange: (turnDeg: number) => void }) {
  const [text, setText] = useState(String(turnDeg));
  const [refusal, setRefusal] = useState<string>();
  useEffect(() => {
    setText(String(turnDeg));
    setRefusal(undefined);
  }, [turnDeg]);
  const take = () => {
    const turned = Number(text.replace("−", "-").replace("°", "").trim());
    if (!Number.isFinite(turned) || turned < -180 || turned > 180) return setRefusal("Degrees from −180 to 180");
    setRefusal(undefined);
    if (turned !== turnDeg) onChange(turned);
  };
  return (
    <TextField
      label="Turned by, degrees"
      className="measure"
      error={refusal}
      inputMode="numeric"
      autoComplete="off"
      value={text}
      onChange={({ target }) => setText(target.value)}
      onBlur={take}
      onKeyDown={({ key }) => key === "Enter" && take()}
    />
  );
}
