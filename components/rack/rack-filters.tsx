"use client";
/** Filters and order of the rack. Every change goes into the page's address. */
import { SlidersHorizontal } from "lucide-react";
import { cutNames, orderNames, stateNames } from "@/components/board/board-words";
import { Button } from "@/components/ui/button";
import { SelectField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { um } from "@/lib/layout";
import { boardQuerySchema, boardSorts, cuts } from "@/lib/schemas/board";
import { clearedState, filterCount, type RackState } from "./rack-query";

interface Props {
  state: RackState;
  species: readonly string[];
  onChange: (change: Partial<RackState>) => void;
}

export function FilterButton({ state, open, onToggle }: { state: RackState; open: boolean; onToggle: () => void }) {
  const count = filterCount(state);
  return (
    <Button aria-expanded={open} aria-controls="rack-filters" onClick={onToggle}>
      <SlidersHorizontal className="size-4" aria-hidden="true" />
      {count > 0 ? `Filters, ${count} set` : "Filters and order"}
    </Button>
  );
}

const zero = um(0);

export function RackFilters({ state, species, onChange }: Props) {
  const least = (value: number) => (value === 0 ? null : um(value));
  return (
    <section
      id="rack-filters"
      aria-label="Filters and order"
      className="grid grid-cols-2 gap-3 border-b border-rule bg-sheet px-4 py-4 md:grid-cols-4 md:px-5 xl:grid-cols-8"
    >
      <SelectField label="Species" value={state.species} onChange={(event) => onChange({ species: event.target.value })}>
        <option value="">any</option>
        {species.map((name) => (
          <option key={name}>{name}</option>
        ))}
      </SelectField>
      <SelectField
        label="Cut"
        value={state.cut}
        onChange={(event) => onChange({ cut: boardQuerySchema.shape.cut.parse(event.target.value) })}
      >
        <option value="">any</option>
        {cuts.map((cut) => (
          <option key={cut} value={cut}>
            {cutNames[cut]}
          </option>
        ))}
      </SelectField>
      <LengthField
        label="Length, at least"
        value={least(state.minLengthUm)}
        onChange={(value) => onChange({ minLengthUm: value ?? zero })}
      />
      <LengthField
        label="Width, at least"
        value={least(state.minWidthUm)}
        onChange={(value) => onChange({ minWidthUm: value ?? zero })}
      />
      <LengthField
        label="Thickness, at least"
        value={least(state.minThicknessUm)}
        onChange={(value) => onChange({ minThicknessUm: value ?? zero })}
      />
      <SelectField
        label="State"
        value={state.state}
        onChange={(event) => onChange({ state: boardQuerySchema.shape.state.parse(event.target.value) })}
      >
        <option value="rack">{stateNames.rack}</option>
        <option value="cut">{stateNames.cut}</option>
        <option value="gone">{stateNames.gone}</option>
        <option value="all">any</option>
      </SelectField>
      <SelectField
        label="Held"
        value={state.free}
        onChange={(event) => onChange({ free: boardQuerySchema.shape.free.parse(event.target.value) })}
      >
        <option value="all">free or held</option>
        <option value="yes">free</option>
        <option value="no">held for a job</option>
      </SelectField>
      <SelectField
        label="Order"
        value={`${state.sort} ${state.direction}`}
        onChange={(event) => {
          const [sort, direction] = event.target.value.split(" ");
          onChange({ ...boardQuerySchema.pick({ sort: true, direction: true }).parse({ sort, direction }) });
        }}
      >
        {boardSorts.flatMap((sort) =>
          (["up", "down"] as const).map((direction) => (
            <option key={`${sort} ${direction}`} value={`${sort} ${direction}`}>
              {orderNames[sort][direction]}
            </option>
          )),
        )}
      </SelectField>
      {filterCount(state) > 0 && (
        <div className="col-span-full">
          <Button size="small" onClick={() => onChange(clearedState(state))}>
            Clear filters
          </Button>
        </div>
      )}
    </section>
  );
}
