"use client";
/** Sends files a few at a time, tells how far each is, stops and retries. A retry goes under the same key, so nothing is doubled. */
import { useQueryClient } from "@tanstack/react-query";
import { useCallback, useEffect, useReducer, useRef } from "react";
import { FaultFromServer, messageOf } from "@/lib/client/fault-from-server";
import { photoKeys } from "@/lib/client/photo";
import { uploadPhoto } from "@/lib/client/upload-photo";
import { isOnItsWay, newUpload, type Upload, type UploadProgress, uploadsAfter } from "./upload-list-state";

/** More at once would only share the same line, and the server looks at two pictures at a time. */
const atOnce = 2;

export interface Uploads {
  readonly list: readonly Upload[];
  readonly add: (files: Iterable<File>) => void;
  readonly cancel: (key: string) => void;
  readonly retry: (key: string) => void;
  readonly forget: (key: string) => void;
}

export function useUploads(): Uploads {
  const client = useQueryClient();
  const [list, dispatch] = useReducer(uploadsAfter, []);
  const sending = useRef(new Map<string, AbortController>());
  const move = useCallback((key: string, progress: UploadProgress) => dispatch({ event: "moved", key, progress }), []);

  const send = useCallback(
    async ({ key, file }: Upload) => {
      const stop = new AbortController();
      sending.current.set(key, stop);
      move(key, { is: "sending", share: 0 });
      const onProgress = (share: number) => move(key, { is: "sending", share });
      const sent = uploadPhoto({
        file,
        fileName: file.name || "photograph",
        uploadKey: key,
        onProgress,
        signal: stop.signal,
      });
      const ended = await sent.then(
        (photo): UploadProgress => ({ is: "done", photo }),
        (error: unknown): UploadProgress => (stop.signal.aborted ? { is: "cancelled" } : failed(error)),
      );
      // Free before it is told: the next file is sent when the list changes.
      sending.current.delete(key);
      move(key, ended);
      if (ended.is === "done") await client.invalidateQueries({ queryKey: photoKeys.loose });
    },
    [client, move],
  );

  useEffect(() => {
    const free = atOnce - sending.current.size;
    const next = list
      .filter(({ key, progress }) => progress.is === "waiting" && !sending.current.has(key))
      .slice(0, Math.max(0, free));
    for (const upload of next) void send(upload);
  }, [list, send]);

  useLeaveWarning(list.some(isOnItsWay));

  return {
    list,
    add: useCallback(
      (files) => dispatch({ event: "added", uploads: Array.from(files, (file) => newUpload(file, crypto.randomUUID())) }),
      [],
    ),
    cancel: useCallback(
      (key) => {
        const stop = sending.current.get(key);
        if (stop) stop.abort(new DOMException("cancelled by the user", "AbortError"));
        else move(key, { is: "cancelled" });
      },
      [move],
    ),
    retry: useCallback((key) => move(key, { is: "waiting" }), [move]),
    forget: useCallback((key) => dispatch({ event: "removed", key }), []),
  };
}

/** What the file itself is refused for does not get better by sending it again. */
function failed(error: unknown): UploadProgress {
  const mayRetry = !(error instanceof FaultFromServer) || error.fault.status >= 500 || error.fault.status === 400;
  return { is: "failed", message: messageOf(error), mayRetry };
}

/** The browser asks before a page with files on their way is left. */
function useLeaveWarning(busy: boolean): void {
  useEffect(() => {
    if (!busy) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [busy]);
}
