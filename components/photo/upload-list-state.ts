/** What is known of each file on its way to the server. Pure: the sending is `use-uploads.ts`. */
import type { Photo } from "@/lib/schemas/photo";
import { maxUploadBytes } from "@/lib/schemas/upload-limits";

export interface Upload {
  /** The upload key: the same for every try of this file. */
  readonly key: string;
  readonly file: File;
  readonly progress: UploadProgress;
}

export type UploadProgress =
  | { readonly is: "waiting" }
  /** Share of the bytes sent; at 1 the server looks at the picture. */
  | { readonly is: "sending"; readonly share: number }
  | { readonly is: "done"; readonly photo: Photo }
  | { readonly is: "failed"; readonly message: string; readonly mayRetry: boolean }
  | { readonly is: "cancelled" };

export type UploadEvent =
  | { readonly event: "added"; readonly uploads: readonly Upload[] }
  | { readonly event: "moved"; readonly key: string; readonly progress: UploadProgress }
  | { readonly event: "removed"; readonly key: string };

const mb = (bytes: number) => (bytes / (1024 * 1024)).toFixed(1);

/** A file as it joins the list; one that is too large is turned away before it is sent. */
export function newUpload(file: File, key: string): Upload {
  if (file.size <= maxUploadBytes) return { key, file, progress: { is: "waiting" } };
  const message = `The file has ${mb(file.size)} MB; at most ${mb(maxUploadBytes)} MB are taken in. Send it smaller.`;
  return { key, file, progress: { is: "failed", message, mayRetry: false } };
}

export function uploadsAfter(uploads: readonly Upload[], event: UploadEvent): readonly Upload[] {
  switch (event.event) {
    case "added":
      return [...uploads, ...event.uploads];
    case "moved":
      return uploads.map((upload) => (upload.key === event.key ? { ...upload, progress: event.progress } : upload));
    case "removed":
      return uploads.filter(({ key }) => key !== event.key);
  }
}

export const isOnItsWay = ({ progress }: Upload): boolean => progress.is === "waiting" || progress.is === "sending";
