"use client";
/** What comes of a draft: worked out by the core from the boards' pictures, with the same functions as on the server. */
import { useQueries } from "@tanstack/react-query";
import { useMemo } from "react";
import { straighteningQuery } from "@/lib/client/straightening";
import { type BlankOutcome, composeBlank } from "@/lib/layout";
import type { Straightening } from "@/lib/schemas/straightening";
import { type BlankDraft, memberForCore, pictureOf } from "./blank-draft";

export interface BlankPlanned {
  /** By board. */
  readonly pictures: ReadonlyMap<string, Straightening>;
  /** null while pictures are on their way, or a board has none of the side that comes up. */
  readonly outcome: BlankOutcome | null;
  readonly error: Error | null;
}

export function useBlankPlan(draft: BlankDraft): BlankPlanned {
  const { members, jointing } = draft;
  const ids = members.flatMap((member) => pictureOf(member) ?? []);
  const { data, error } = useQueries({
    queries: ids.map(straighteningQuery),
    combine: (results) => ({
      data: results.flatMap((result) => result.data ?? []),
      error: results.find((result) => result.error)?.error ?? null,
    }),
  });
  return useMemo(() => {
    const pictures = new Map(
      members.flatMap((member) => {
        const found = data.find(({ id }) => id === pictureOf(member));
        return found ? [[member.board.id, found] as const] : [];
      }),
    );
    const drawn = members.flatMap((member) => {
      const picture = pictures.get(member.board.id);
      return picture ? memberForCore(member, picture) : [];
    });
    const outcome = drawn.length === members.length ? composeBlank({ members: drawn, jointing }) : null;
    return { pictures, outcome, error };
  }, [members, jointing, data, error]);
}
