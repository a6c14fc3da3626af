"use client";
import { useId } from "react";
import type { PartName, Weights } from "@/lib/layout";
import { placeParts } from "@/lib/schemas/place-parts";
import { partWords } from "@/lib/words/wood-search";

interface Props {
  weights: Weights;
  onChange: (weights: Weights) => void;
  /** Parts that say nothing here. */
  without?: readonly PartName[];
}

/** What counts how much in a search. */
export function WeightsForm({ weights, onChange, without = [] }: Props) {
  const id = useId();
  return (
    <fieldset className="grid gap-x-6 gap-y-1 sm:grid-cols-2">
      <legend className="mb-1 text-sm font-semibold">What counts how much</legend>
      {placeParts
        .filter((part) => !without.includes(part))
        .map((part) => (
          <div key={part} className="flex items-center gap-3">
            <label htmlFor={`${id}-${part}`} className="w-44 shrink-0 text-sm" title={partWords[part].means}>
              {partWords[part].name}
            </label>
            <input
              id={`${id}-${part}`}
              type="range"
              min={0}
              max={5}
              step={1}
              value={weights[part]}
              onChange={(event) => onChange({ ...weights, [part]: Number(event.target.value) })}
              className="min-h-6 grow accent-chalk"
            />
            <output className="measure w-4 text-right text-sm">{weights[part]}</output>
          </div>
        ))}
    </fieldset>
  );
}
