"use client";
import { useEffect, useState } from "react";
import { Pictures } from "@/lib/editor/canvas/pictures";

export interface PicturesAtHand {
  readonly pictures: Pictures;
  /** Counts the pictures that have come: what is painted from them is painted again. */
  readonly come: number;
}

/** The pictures of boards for all views below a component, each fetched and decoded once; null before the page has mounted. */
export function usePictures(): PicturesAtHand | null {
  const [atHand, setAtHand] = useState<PicturesAtHand | null>(null);
  useEffect(() => {
    const pictures = new Pictures(() => setAtHand((before) => before && { pictures, come: before.come + 1 }));
    setAtHand({ pictures, come: 0 });
    return () => pictures.dispose();
  }, []);
  return atHand;
}
