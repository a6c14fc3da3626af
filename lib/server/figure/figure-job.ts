/** What the figure threads are asked and what they answer. Plain values that survive being copied between threads. */
import "server-only";
import type { FaceLayout, GrainField, KeepClearSuggestion, SeamReading, StockId } from "@/lib/layout";

/** A stored level of a straightened picture. */
export interface StoredPicture {
  readonly key: string;
  readonly pxPerMm: number;
}

export interface FigureJobs {
  readonly readSeamsOf: {
    readonly request: {
      readonly layout: FaceLayout;
      readonly pictures: readonly (StoredPicture & { readonly stockId: StockId })[];
    };
    readonly answer: readonly SeamReading[];
  };
  readonly suggest: { readonly request: StoredPicture; readonly answer: readonly KeepClearSuggestion[] };
  readonly readGrain: { readonly request: StoredPicture; readonly answer: GrainField };
}

export type FigureJobName = keyof FigureJobs;
