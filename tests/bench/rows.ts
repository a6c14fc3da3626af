/** The table's lines, in its order. */
import type { Row } from "./row";
import { jobRow } from "./rows/job";
import { guillotineRow, rackRow } from "./rows/not-built";
import { serverRow } from "./rows/server";
import { straightenRow } from "./rows/straighten";
import { warpRow } from "./rows/warp";

export const rows: readonly Row[] = [straightenRow, warpRow, rackRow, guillotineRow, jobRow, serverRow];
