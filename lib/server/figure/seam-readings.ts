/** What the photographs say about the seams of a saved layout. */
import "server-only";
import type { z } from "zod";
import { findLayout, listLayoutBoards } from "@/db/queries/layout";
import type { getSeamReadings } from "@/lib/schemas/figure";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound } from "../faults";
import { figureLevel } from "./figure-level";
import { readFigure } from "./figure-pool";
import { toneBetween } from "./tone";

export async function seamReadings(
  access: ShopAccess,
  faceId: string,
  signal: AbortSignal,
): Promise<z.input<typeof getSeamReadings.response>> {
  const db = database();
  const found = await findLayout(db, access.shopId, faceId);
  if (!found) throw notFound("face");
  const { document, revision } = found.layout;
  const boards = await listLayoutBoards(db, access.shopId, found.layout.id);
  const used = new Set(document.groups.flatMap(({ placement }) => placement?.stockId ?? []));
  const pictures = boards.flatMap(({ board, straightening }) => {
    const level = used.has(board.id) ? figureLevel(straightening) : null;
    return level ? [{ stockId: board.id, ...level }] : [];
  });
  const readings = await readFigure("readSeamsOf", { layout: document, pictures }, signal);
  return {
    revision,
    items: readings.map(({ a, b, meanA, meanB, figure }) => ({
      a,
      b,
      tone: meanA && meanB ? toneBetween(meanA, meanB) : null,
      figure,
    })),
  };
}
