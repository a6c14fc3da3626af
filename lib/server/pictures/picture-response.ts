/** Answers with one stored level of a picture. */
import "server-only";
import type { z } from "zod";
import type { pictureLevelsSchema } from "@/lib/schemas/photo";
import { notFound } from "../faults";
import { fileResponse } from "../http/binary";
import { storage } from "../storage";

/** A level never changes once it is written, so browsers may keep it. */
export async function pictureResponse(
  levels: z.output<typeof pictureLevelsSchema>,
  level: number,
  fileName: string,
): Promise<Response> {
  const key = levels.find((stored) => stored.level === level)?.key;
  const file = key === undefined ? null : await storage().stream(key);
  if (file === null) throw notFound("picture");
  return fileResponse({ bytes: file.stream, kind: "image/jpeg", fileName, immutable: true });
}
