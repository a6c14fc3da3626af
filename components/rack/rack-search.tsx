"use client";
/** Searching the rack while typing. */
import { useEffect, useState } from "react";
import type { RackState } from "./rack-query";

/** Long enough that a word is typed, short enough that the list seems to follow. */
const typingMs = 250;

/** The text in the search box. A search changed from outside is taken over; one's own typing keeps its spaces. */
export function useSearchText(search: string) {
  const [text, setText] = useState(search);
  useEffect(() => setText((now) => (now.trim() === search ? now : search)), [search]);
  return [text, setText] as const;
}

interface Props {
  state: RackState;
  text: string;
  onText: (text: string) => void;
  onChange: (change: Partial<RackState>) => void;
}

export function RackSearch({ state, text, onText, onChange }: Props) {
  useEffect(() => {
    const search = text.trim();
    if (search === state.search) return;
    const timer = setTimeout(() => onChange({ search }), typingMs);
    return () => clearTimeout(timer);
  }, [text, state.search, onChange]);
  return (
    <input
      type="search"
      aria-label="Search the rack"
      placeholder="Species, tag or place"
      className="min-h-11 w-full rounded-md border border-line bg-sheet px-3 placeholder:text-pencil md:min-h-10 md:w-56"
      value={text}
      onChange={(event) => onText(event.target.value)}
    />
  );
}
