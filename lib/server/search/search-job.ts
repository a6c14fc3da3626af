/** What a search thread is asked and what it answers. Plain values that survive being copied between threads. */
import "server-only";
import type { MessagePort } from "node:worker_threads";
import type { BoardFace, PlaceRequest, PlaceSearch, SideName, StockId } from "@/lib/layout";
import type { StoredPicture } from "../figure/figure-job";
import type { CancelFlag } from "../pictures/cancel-flag";

export interface SearchedSide {
  readonly side: SideName;
  readonly board: BoardFace;
  readonly picture: StoredPicture;
}

export interface SearchAsked {
  /** Without the pictures, which the thread reads itself. */
  readonly request: Omit<PlaceRequest, "sides" | "neighbours">;
  readonly sides: readonly SearchedSide[];
  readonly neighbours: readonly { readonly stockId: StockId; readonly board: BoardFace; readonly picture: StoredPicture }[];
}

export interface SearchTask {
  readonly asked: SearchAsked;
  readonly cancel: CancelFlag;
  /** Gets numbers from 0 to 1. */
  readonly progress: MessagePort;
}

export type SearchAnswer = PlaceSearch;
