"use client";
/** The layout with the drag in progress, a few times a second: figures that change faster cannot be read. */
import { useEffect, useState } from "react";
import { shownLayout } from "@/lib/editor/editor";
import type { FaceLayout } from "@/lib/layout";
import { useTableContext } from "./table-context";

const EVERY_MS = 120;

export function useLiveLayout(): FaceLayout {
  const { editor } = useTableContext();
  const [layout, setLayout] = useState(() => shownLayout(editor.get()));
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | null = null;
    const take = () => {
      timer = null;
      setLayout(shownLayout(editor.get()));
    };
    const heard = () => {
      // A finished step is shown at once, a drag at its pace.
      if (editor.get().preview === null) {
        if (timer) clearTimeout(timer);
        take();
      } else timer ??= setTimeout(take, EVERY_MS);
    };
    const stop = editor.subscribe(heard);
    heard();
    return () => {
      stop();
      if (timer) clearTimeout(timer);
    };
  }, [editor]);
  return layout;
}
