"use client";
import { useEffect } from "react";

const question = "Leave without saving? What you have changed here will be lost.";

/** Asks before the page is left while something is unsaved: by closing, by reloading, or by a link. */
export function useUnsavedWarning(unsaved: boolean): void {
  useEffect(() => {
    if (!unsaved) return;
    const onLeave = (event: BeforeUnloadEvent) => event.preventDefault();
    // Links inside the product change the page without unloading it.
    const onClick = (event: MouseEvent) => {
      const link = event.target instanceof Element ? event.target.closest("a[href]") : null;
      if (!link || event.ctrlKey || event.metaKey || event.shiftKey || link.getAttribute("target") === "_blank") return;
      if (window.confirm(question)) return;
      event.preventDefault();
      event.stopPropagation();
    };
    window.addEventListener("beforeunload", onLeave);
    document.addEventListener("click", onClick, { capture: true });
    return () => {
      window.removeEventListener("beforeunload", onLeave);
      document.removeEventListener("click", onClick, { capture: true });
    };
  }, [unsaved]);
}
