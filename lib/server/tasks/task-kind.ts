/** What a kind of long work has to say for itself. */
import "server-only";
import type { Connection } from "@/db/client";
import type { ShopId } from "@/db/shop-id";

export interface TaskContext {
  readonly shopId: ShopId;
  readonly taskId: string;
  readonly createdBy: string | null;
  /** Fires when somebody cancelled, the lease was lost or the process is ending. */
  readonly signal: AbortSignal;
  /** 0 to 1; written to the row now and then. */
  readonly onProgress: (share: number) => void;
}

/** Keeps the result. Runs in the transaction that ends the task, so it happens once or not at all. */
export type Keep = (tx: Connection, at: Date) => Promise<void>;

export interface TaskKind {
  /** Does the work away from the database's sight and answers how to keep it. May run again after a kill. */
  readonly work: (payload: unknown, context: TaskContext) => Promise<Keep>;
  /** What a failure or a cancel leaves behind, in the transaction that ends the task. */
  readonly abandon: (
    payload: unknown,
    context: { shopId: ShopId; taskId: string },
    why: { state: "failed" | "cancelled"; message: string },
    tx: Connection,
  ) => Promise<void>;
}
