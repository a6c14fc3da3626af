/** The grain of a board's picture. */
import "server-only";
import { grainFieldSchema } from "@/lib/schemas/figure";
import type { ShopAccess } from "../access";
import { readFigure } from "./figure-pool";
import { keptReading } from "./kept-reading";

export const grainOf = (access: ShopAccess, straighteningId: string, signal: AbortSignal) =>
  keptReading(access, straighteningId, {
    schema: grainFieldSchema,
    name: "grain-2.json",
    async read(picture) {
      const { cellMm, columns, rows, direction, coherence } = await readFigure("readGrain", picture, signal);
      return {
        cellMm,
        columns,
        rows,
        // A tenth of a degree and a hundredth: finer than what is read, and a third of the bytes.
        directionDeg: Array.from(direction, (radians) => Math.round((radians * 1800) / Math.PI) / 10),
        coherence: Array.from(coherence, (share) => Math.round(share * 100) / 100),
      };
    },
  });
