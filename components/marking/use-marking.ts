"use client";
/** The draft on the screen, what is selected, and what the core makes of it. */
import { useDeferredValue, useMemo, useState } from "react";
import { fitMarking, type MarkingFit, type PhotoSize } from "@/lib/layout";
import type { MovePhase } from "../picture/handle";
import type { Place } from "../picture/view";
import type { Draft } from "./draft";
import { type DraftOutcome, markingOf } from "./marking-of";
import { type MarkId, moveMark, nearestEdge, removeMark, rounded, withinPhoto } from "./marks";

export type Adding = "extra" | "edge" | "known-from" | "known-to";

export interface MarkingState {
  readonly photo: PhotoSize;
  readonly draft: Draft;
  readonly selected: MarkId | null;
  /** What a tap on the photograph adds. */
  readonly adding: Adding | null;
  /** The mark being dragged or stepped, for the loupe. */
  readonly moving: MarkId | null;
  readonly outcome: DraftOutcome;
  /** null while something is missing. */
  readonly fit: MarkingFit | null;
  readonly dirty: boolean;
  change: (next: (draft: Draft) => Draft) => void;
  select: (mark: MarkId | null) => void;
  move: (mark: MarkId, to: Place, phase?: MovePhase) => void;
  remove: (mark: MarkId) => void;
  add: (what: Adding | null) => void;
  tap: (at: Place) => void;
  endMove: () => void;
}

export function useMarking(photo: PhotoSize, start: () => Draft): MarkingState {
  const [first] = useState(start);
  const [draft, setDraft] = useState(first);
  const [selected, setSelected] = useState<MarkId | null>(null);
  const [moving, setMoving] = useState<MarkId | null>(null);
  const [adding, setAdding] = useState<Adding | null>(null);

  // The lens fit takes some milliseconds; the handles must not wait for it.
  const settled = useDeferredValue(draft);
  const outcome = useMemo(() => markingOf(settled), [settled]);
  const fit = useMemo(() => (outcome.complete ? fitMarking(outcome.marking, photo) : null), [outcome, photo]);

  const select = (mark: MarkId | null) => {
    setSelected(mark);
    setMoving(null);
  };
  const tap = (to: Place) => {
    const at = rounded(withinPhoto(to, photo));
    if (adding === "extra") {
      setDraft({ ...draft, extraPoints: [...draft.extraPoints, { photo: at, x: null, y: null }] });
      select({ of: "extra", index: draft.extraPoints.length });
      setAdding(null);
    } else if (adding === "edge") {
      setDraft({ ...draft, edgePoints: [...draft.edgePoints, { photo: at, edge: nearestEdge(draft.corners, at) }] });
      select({ of: "edge", index: draft.edgePoints.length });
    } else if (adding === "known-from") {
      setDraft({ ...draft, known: { from: at, to: at, trueLength: draft.known?.trueLength ?? null } });
      setAdding("known-to");
    } else if (adding === "known-to" && draft.known) {
      setDraft({ ...draft, known: { ...draft.known, to: at } });
      select({ of: "known", index: 1 });
      setAdding(null);
    }
  };
  return {
    photo,
    draft,
    selected,
    adding,
    moving,
    outcome,
    fit,
    dirty: draft !== first,
    change: setDraft,
    select,
    move: (mark, to, phase = "end") => {
      setDraft((from) => moveMark(from, mark, rounded(withinPhoto(to, photo))));
      setMoving(phase === "moving" || phase === "key" ? mark : null);
    },
    remove: (mark) => {
      setDraft((from) => removeMark(from, mark));
      select(null);
    },
    add: (what) => {
      setAdding(what);
      select(null);
    },
    tap,
    endMove: () => setMoving(null),
  };
}
