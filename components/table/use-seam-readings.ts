"use client";
/** What the photographs say about the seams: read by the server from what is saved, so it comes a moment after a change. */
import { keepPreviousData, useQuery } from "@tanstack/react-query";
import { useRef } from "react";
import { seamReadingsQuery } from "@/lib/client/figure";
import type { TableDocument } from "@/lib/editor/document";
import type { Seam } from "@/lib/layout";
import type { SeamReadingOnWire } from "@/lib/schemas/figure";
import { useEditorState, useTableContext } from "./table-context";

export interface SeamReadings {
  readonly of: (seam: Pick<Seam, "a" | "b">) => SeamReadingOnWire | null;
  /** False while what is shown belongs to an earlier state of the layout. */
  readonly fresh: boolean;
  readonly failed: boolean;
}

export function useSeamReadings(): SeamReadings {
  const { faceId } = useTableContext();
  const saved = useEditorState(({ sync, document }) => (sync.kind === "saved" ? document : null));
  const moving = useEditorState(({ preview }) => preview !== null);
  const number = useSavedNumber(saved);
  const query = useQuery({ ...seamReadingsQuery(faceId, number), enabled: saved !== null, placeholderData: keepPreviousData });
  const bySeam = new Map(query.data?.items.map((reading) => [`${reading.a} ${reading.b}`, reading]));
  return {
    of: ({ a, b }) => bySeam.get(`${a} ${b}`) ?? null,
    fresh: saved !== null && !moving && query.isSuccess && !query.isPlaceholderData,
    failed: query.isError,
  };
}

/** Counts the documents that were saved while the table is open: a save asks the server anew. */
function useSavedNumber(saved: TableDocument | null): number {
  const last = useRef<{ document: TableDocument | null; number: number }>({ document: null, number: 0 });
  if (saved !== null && saved !== last.current.document) {
    last.current = { document: saved, number: last.current.number + 1 };
  }
  return last.current.number;
}
