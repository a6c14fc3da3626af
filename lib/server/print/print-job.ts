/** What a printing thread is asked, by name. Plain values that survive being copied between threads. */
import "server-only";
import type { LabelSheetName } from "./label-sheet";
import type { Paper } from "./paper";
import type { PrintOrder } from "./print-order";

export interface PrintJobs {
  readonly order: { readonly print: PrintOrder; readonly paper: Paper };
  readonly labels: { readonly order: PrintOrder["order"]; readonly sheet: LabelSheetName; readonly start: number };
}
