"use client";
/** What each side shows, and at what scale. */
import type { ReactNode } from "react";
import { tableGeometry } from "@/lib/editor/view/geometry";
import { NudgePad } from "./nudge-pad";
import { useEditorState, useTableContext, useViewState } from "./table-context";
import { useGrains } from "./use-grains";

export function ShowHeading() {
  const scale = useScale("show");
  return (
    <Heading title="Show side" told={scale}>
      {null}
    </Heading>
  );
}

export function StockHeading() {
  const { editor } = useTableContext();
  const scale = useScale("stock");
  const { reading, failed } = useGrains();
  const grain = failed ? ", the grain could not be read" : reading ? ", reading the grain…" : "";
  return (
    <Heading title="Stock side" told={`${scale}${grain}`}>
      {editor.mayChange && <NudgePad />}
    </Heading>
  );
}

function Heading({ title, told, children }: { title: string; told: string; children: ReactNode }) {
  return (
    <div className="flex min-h-10 flex-wrap items-center justify-between gap-x-4 border-t border-rule bg-sheet px-4 py-1 first:border-t-0">
      <p className="flex items-baseline gap-2">
        <span className="font-measure text-base font-semibold whitespace-nowrap">{title}</span>
        <span className="text-sm text-pencil">{told}</span>
      </p>
      {children}
    </div>
  );
}

/** The reference pixel of style sheets is 1/96 in; how large it is on this very screen a page cannot know. */
const PX_PER_MM = 96 / 25.4;

function useScale(side: "show" | "stock"): string {
  const sides = useViewState((state) => state.sides);
  const view = useViewState((state) => state.view);
  const boards = useEditorState((state) => state.boardFaces);
  const face = useEditorState((state) => state.document.layout.face);
  if (!sides || (side === "stock" && boards.length === 0)) return "";
  const geometry = tableGeometry({ boards, face }, sides, view);
  const pxPerMm = side === "show" ? geometry.showPxPerMm : geometry.stockPxPerMm;
  const ratio = PX_PER_MM / pxPerMm;
  const about = ratio >= 1 ? `about 1 : ${ratio.toFixed(1)}` : `about ${(1 / ratio).toFixed(1)} : 1`;
  if (side === "stock" || boards.length === 0) return about;
  return geometry.oneScale ? `${about}, as the stock side` : `${about}, larger than the stock side`;
}
