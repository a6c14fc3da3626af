"use client";
import { useUnits } from "@/components/shell/units";
import { Choice } from "@/components/ui/choice";
import { NumberField } from "@/components/ui/number-field";
import { type Air, type Climate, defaultClimate, FIBRE_SATURATION, yearlyMoisture } from "@/lib/layout";
import { fahrenheitOf, percentText } from "@/lib/words/movement";

interface Props {
  climate: Climate;
  onChange: (climate: Climate) => void;
  disabled?: boolean;
}

const kinds = [
  { value: "air", label: "Air, by a hygrometer" },
  { value: "moisture", label: "Moisture of wood that stands there" },
] as const;

const seasons = [
  { season: "driest", name: "Driest" },
  { season: "dampest", name: "Dampest" },
] as const;

/** Where furniture lives: as air at its driest and dampest, or as the moisture that wood has there. */
export function ClimateFields({ climate, onChange, disabled = false }: Props) {
  const { driest, dampest } = yearlyMoisture(climate);
  return (
    <div className="flex flex-col gap-3">
      <fieldset disabled={disabled}>
        <Choice
          legend="Told as"
          value={climate.kind}
          options={kinds}
          onChange={(kind) => kind !== climate.kind && onChange(toldAs(kind, climate))}
        />
      </fieldset>
      {seasons.map(({ season, name }) =>
        climate.kind === "air" ? (
          <AirFields
            key={season}
            name={name}
            air={climate[season]}
            disabled={disabled}
            onChange={(air) => onChange({ ...climate, [season]: air })}
          />
        ) : (
          <NumberField
            key={season}
            label={`${name}: moisture of the wood, %`}
            value={climate[season]}
            min={0}
            max={FIBRE_SATURATION}
            required
            disabled={disabled}
            onChange={(moisture) => moisture !== null && onChange({ ...climate, [season]: moisture })}
          />
        ),
      )}
      {driest > dampest ? (
        <p className="text-sm text-crayon">
          The driest is damper than the dampest: {percentText(driest)} against {percentText(dampest)}.
        </p>
      ) : (
        <p className="text-sm">
          Wood there comes to <span className="measure text-base">{driest.toFixed(1)}</span> to{" "}
          <span className="measure text-base">{percentText(dampest)}</span>.
        </p>
      )}
    </div>
  );
}

/** Whether the driest is no damper than the dampest: nothing else is taken. */
export function inOrder(climate: Climate): boolean {
  const { driest, dampest } = yearlyMoisture(climate);
  return driest <= dampest;
}

function AirFields({
  name,
  air,
  onChange,
  disabled,
}: {
  name: string;
  air: Air;
  onChange: (air: Air) => void;
  disabled: boolean;
}) {
  const { units } = useUnits();
  const celsius = units === "mm";
  const shown = celsius ? air.celsius : fahrenheitOf(air.celsius);
  return (
    <div className="grid grid-cols-2 items-start gap-3">
      <NumberField
        label={`${name}: humidity, %`}
        value={air.humidity}
        min={5}
        max={95}
        digits={0}
        required
        disabled={disabled}
        onChange={(humidity) => humidity !== null && onChange({ ...air, humidity })}
      />
      <NumberField
        label={`${name}: temperature, ${celsius ? "°C" : "°F"}`}
        value={Math.round(shown * 10) / 10}
        min={celsius ? -10 : 14}
        max={celsius ? 50 : 122}
        required
        disabled={disabled}
        onChange={(degrees) => degrees !== null && onChange({ ...air, celsius: celsius ? degrees : ((degrees - 32) * 5) / 9 })}
      />
    </div>
  );
}

/** Air as moisture begins with what that air makes of wood; the other way with the rooms most furniture stands in. */
function toldAs(kind: Climate["kind"], before: Climate): Climate {
  if (kind === "air") {
    return defaultClimate;
  }
  const { driest, dampest } = yearlyMoisture(before);
  return { kind, driest: tenths(driest), dampest: tenths(dampest) };
}

const tenths = (percent: number) => Math.round(percent * 10) / 10;
