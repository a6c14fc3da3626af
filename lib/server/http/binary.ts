/** Answers with a file. The type is fixed by the endpoint; browsers are told not to guess another. */
import "server-only";
import type { BinaryKind } from "@/lib/schemas/endpoint";

export interface FileAnswer {
  readonly bytes: Uint8Array | ReadableStream<Uint8Array>;
  readonly kind: BinaryKind;
  /** Shown name when saved; plain ASCII. */
  readonly fileName: string;
  /** Pictures of a version never change; documents are made anew. */
  readonly immutable: boolean;
}

export function fileResponse({ bytes, kind, fileName, immutable }: FileAnswer): Response {
  const body = bytes instanceof Uint8Array ? new Uint8Array(bytes) : bytes;
  return new Response(body, {
    headers: {
      "content-type": kind,
      "content-disposition": `inline; filename="${fileName.replace(/[^\w.-]/g, "_")}"`,
      "cache-control": immutable ? "private, max-age=31536000, immutable" : "private, no-store",
      "x-content-type-options": "nosniff",
      "content-security-policy": "default-src 'none'; sandbox",
    },
  });
}
