"use client";
import { useEffect, useRef, useState } from "react";
import { type PhotoGeometry, type Pixels, warpMapAt } from "@/lib/layout";
import { drawInSlices, type Wish } from "./draw-in-slices";
import { mapOnLevel } from "./level-map";

interface Wanted {
  readonly geometry: PhotoGeometry;
  /** Width of the full-size photograph, px. */
  readonly photoWidthPx: number;
  readonly pxPerMm: number;
  readonly widthPx: number;
  readonly heightPx: number;
}

/**
 * The straightened picture as it would come out, drawn small from a level of the photograph. While one is being drawn only the newest wish is kept, so that the
 * preview follows a drag however fast it goes; the last picture stays until the next is there.
 */
export function usePreview(image: HTMLImageElement | null, wanted: Wanted): ImageData | null {
  const photo = useRef<{ image: HTMLImageElement; pixels: Pixels } | null>(null);
  const queue = useRef<Queue | null>(null);
  const [picture, setPicture] = useState<ImageData | null>(null);

  useEffect(() => {
    const ended = new AbortController();
    queue.current = { busy: false, next: null, signal: ended.signal };
    return () => ended.abort();
  }, []);

  useEffect(() => {
    const waiting = queue.current;
    if (!image || !waiting) return;
    if (photo.current?.image !== image) photo.current = { image, pixels: pixelsOf(image) };
    const map = mapOnLevel(warpMapAt(wanted.geometry, wanted.pxPerMm), image.naturalWidth / wanted.photoWidthPx);
    waiting.next = { photo: photo.current.pixels, map, width: wanted.widthPx, height: wanted.heightPx };
    if (!waiting.busy) void workOff(waiting, setPicture);
  }, [image, wanted]);

  return picture;
}

interface Queue {
  busy: boolean;
  next: Wish | null;
  readonly signal: AbortSignal;
}

async function workOff(queue: Queue, show: (picture: ImageData) => void): Promise<void> {
  queue.busy = true;
  for (let wish = queue.next; wish !== null && !queue.signal.aborted; wish = queue.next) {
    queue.next = null;
    const drawn = await drawInSlices(wish, queue.signal);
    if (drawn) show(new ImageData(new Uint8ClampedArray(drawn.data), drawn.width, drawn.height));
  }
  queue.busy = false;
}

function pixelsOf(image: HTMLImageElement): Pixels {
  const canvas = document.createElement("canvas");
  canvas.width = image.naturalWidth;
  canvas.height = image.naturalHeight;
  const context = canvas.getContext("2d", { willReadFrequently: true });
  if (!context) throw new Error("this browser draws no pictures");
  context.drawImage(image, 0, 0);
  const { data, width, height } = context.getImageData(0, 0, canvas.width, canvas.height);
  return { data: new Uint8Array(data.buffer), width, height, channels: 4 };
}
