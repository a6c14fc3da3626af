"use client";
/** The ways a photograph comes in: chosen, dropped, pasted, or taken with the phone's camera. */
import { Camera, ImagePlus } from "lucide-react";
import { type ReactNode, useEffect, useId, useState } from "react";
import { buttonClass } from "@/components/ui/button";

interface Props {
  onFiles: (files: Iterable<File>) => void;
}

/** HEIC is named besides, because browsers do not count it among images everywhere. */
const accepted = "image/*,.heic,.heif";

export function FileSources({ onFiles }: Props) {
  usePastedFiles(onFiles);
  return (
    <DropArea onFiles={onFiles}>
      <div className="flex flex-wrap items-center justify-center gap-2">
        <FileButton onFiles={onFiles} multiple className={buttonClass("primary")}>
          <ImagePlus className="size-5" aria-hidden="true" />
          Choose photographs
        </FileButton>
        <span className="pointer-fine:hidden">
          <FileButton onFiles={onFiles} camera className={buttonClass("plain")}>
            <Camera className="size-5" aria-hidden="true" />
            Take a photograph
          </FileButton>
        </span>
      </div>
      <p className="text-sm text-pencil">
        <span className="pointer-coarse:hidden">Or drop them here, or paste one. </span>
        JPEG, PNG, WebP, AVIF or HEIC, up to 40 MB and 60 megapixels each.
      </p>
    </DropArea>
  );
}

function FileButton({
  onFiles,
  multiple = false,
  camera = false,
  className,
  children,
}: Props & { multiple?: boolean; camera?: boolean; className: string; children: ReactNode }) {
  const id = useId();
  return (
    <span className="relative inline-flex">
      <input
        id={id}
        type="file"
        accept={accepted}
        multiple={multiple}
        {...(camera && { capture: "environment" as const })}
        className="peer sr-only"
        onChange={(event) => {
          onFiles(event.target.files ?? []);
          // The same file can be chosen again after it was removed from the list.
          event.target.value = "";
        }}
      />
      <label
        htmlFor={id}
        className={`${className} peer-focus-visible:outline-2 peer-focus-visible:outline-offset-2 peer-focus-visible:outline-chalk`}
      >
        {children}
      </label>
    </span>
  );
}

function DropArea({ onFiles, children }: Props & { children: ReactNode }) {
  const over = useDroppedFiles(onFiles);
  return (
    <section
      aria-label="Take in photographs"
      className={`flex flex-col items-center gap-3 rounded-md border-2 border-dashed px-4 py-8 text-center ${over ? "border-chalk bg-chalk-wash" : "border-line bg-sheet"}`}
    >
      {children}
    </section>
  );
}

/** Files dropped anywhere on the page: beside the box the browser would leave the page to show the picture. Tells whether some hang over it. */
function useDroppedFiles(onFiles: Props["onFiles"]): boolean {
  const [over, setOver] = useState(false);
  useEffect(() => {
    const hasFiles = (event: DragEvent) => event.dataTransfer?.types.includes("Files") === true;
    const hover = (event: DragEvent) => {
      if (!hasFiles(event)) return;
      event.preventDefault();
      setOver(true);
    };
    const leave = (event: DragEvent) => {
      // Going from one element of the page to the next is not leaving it.
      if (event.relatedTarget === null) setOver(false);
    };
    const drop = (event: DragEvent) => {
      if (!hasFiles(event)) return;
      event.preventDefault();
      setOver(false);
      onFiles(event.dataTransfer?.files ?? []);
    };
    document.addEventListener("dragover", hover);
    document.addEventListener("dragleave", leave);
    document.addEventListener("drop", drop);
    return () => {
      document.removeEventListener("dragover", hover);
      document.removeEventListener("dragleave", leave);
      document.removeEventListener("drop", drop);
    };
  }, [onFiles]);
  return over;
}

function usePastedFiles(onFiles: Props["onFiles"]): void {
  useEffect(() => {
    const take = (event: ClipboardEvent) => {
      const files = event.clipboardData?.files;
      if (files && files.length > 0) onFiles(files);
    };
    document.addEventListener("paste", take);
    return () => document.removeEventListener("paste", take);
  }, [onFiles]);
}
