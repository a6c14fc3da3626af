"use client";
import { Check } from "lucide-react";
import { Button } from "@/components/ui/button";
import { ProgressTape } from "@/components/ui/progress-tape";
import type { Upload } from "./upload-list-state";
import type { Uploads } from "./use-uploads";

/** Files on their way, each with a tape that shows how far it is. */
export function UploadList({ uploads }: { uploads: Uploads }) {
  if (uploads.list.length === 0) return null;
  return (
    <section aria-label="Uploads">
      <ul className="divide-y divide-rule rounded-md border border-rule bg-sheet">
        {uploads.list.map((upload) => (
          <li key={upload.key} className="flex flex-wrap items-center gap-x-4 gap-y-2 px-3 py-2">
            <span className="min-w-0 flex-1 basis-48 truncate text-sm font-semibold">{upload.file.name}</span>
            <UploadState upload={upload} />
            <UploadActions upload={upload} uploads={uploads} />
          </li>
        ))}
      </ul>
    </section>
  );
}

function UploadState({ upload: { file, progress } }: { upload: Upload }) {
  switch (progress.is) {
    case "waiting":
      return <span className="text-sm text-pencil">waits for its turn</span>;
    case "sending":
      return (
        <span className="flex flex-1 basis-48 items-center gap-3">
          <ProgressTape done={Math.round(progress.share * 100)} of={100} label={`Sending ${file.name}`} />
          <span className="measure w-28 text-sm whitespace-nowrap">
            {progress.share < 1 ? `${Math.floor(progress.share * 100)} % sent` : "being looked at"}
          </span>
        </span>
      );
    case "done":
      return (
        <span role="status" className="flex items-center gap-1 text-sm text-moss">
          <Check className="size-4" aria-hidden="true" /> taken in
        </span>
      );
    case "failed":
      return (
        <span role="alert" className="flex-1 basis-64 text-sm text-crayon">
          {progress.message}
        </span>
      );
    case "cancelled":
      return <span className="text-sm text-pencil">cancelled</span>;
  }
}

function UploadActions({ upload, uploads }: { upload: Upload; uploads: Uploads }) {
  const { key, file, progress } = upload;
  const mayRetry = progress.is === "cancelled" || (progress.is === "failed" && progress.mayRetry);
  const onItsWay = progress.is === "waiting" || progress.is === "sending";
  return (
    <span className="ml-auto flex gap-2">
      {onItsWay && (
        <Button size="small" onClick={() => uploads.cancel(key)} aria-label={`Cancel ${file.name}`}>
          Cancel
        </Button>
      )}
      {mayRetry && (
        <Button size="small" onClick={() => uploads.retry(key)} aria-label={`Try ${file.name} again`}>
          Try again
        </Button>
      )}
      {!onItsWay && (
        <Button size="small" kind="quiet" onClick={() => uploads.forget(key)} aria-label={`Take ${file.name} off this list`}>
          Clear
        </Button>
      )}
    </span>
  );
}
