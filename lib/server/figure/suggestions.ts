/** Areas of a board's picture that look as if they should be kept clear. */
import "server-only";
import { suggestionsSchema } from "@/lib/schemas/figure";
import type { ShopAccess } from "../access";
import { readFigure } from "./figure-pool";
import { keptReading } from "./kept-reading";

export const suggestionsOf = (access: ShopAccess, straighteningId: string, signal: AbortSignal) =>
  keptReading(access, straighteningId, {
    schema: suggestionsSchema,
    name: "suggestions-1.json",
    read: async (picture) => ({ items: [...(await readFigure("suggest", picture, signal))] }),
  });
