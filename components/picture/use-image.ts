"use client";
import { useEffect, useState } from "react";

export type LoadedImage =
  | { readonly state: "none" | "loading" | "failed"; readonly image: null }
  | { readonly state: "ready"; readonly image: HTMLImageElement };

/** A picture, decoded and ready to draw from. `null`: nothing is wanted yet. */
export function useImage(url: string | null): LoadedImage {
  const [loaded, setLoaded] = useState<{ url: string; image: HTMLImageElement | null }>();
  useEffect(() => {
    if (url === null) return;
    let wanted = true;
    const image = new Image();
    image.src = url;
    image.decode().then(
      () => wanted && setLoaded({ url, image }),
      () => wanted && setLoaded({ url, image: null }),
    );
    return () => {
      wanted = false;
    };
  }, [url]);
  if (url === null) return { state: "none", image: null };
  if (loaded?.url !== url) return { state: "loading", image: null };
  return loaded.image ? { state: "ready", image: loaded.image } : { state: "failed", image: null };
}
