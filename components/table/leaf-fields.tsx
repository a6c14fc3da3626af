"use client";
/** Sizes of a resawn pair. */
import { ResawnFields } from "@/components/face/resawn-fields";
import { changeSizes } from "@/lib/editor/commands/change-sizes";
import type { ResawnFace } from "@/lib/layout";
import { useTableContext } from "./table-context";

export function LeafFields({ face }: { face: ResawnFace }) {
  const { editor } = useTableContext();
  return (
    <fieldset disabled={!editor.mayChange}>
      <ResawnFields
        draft={face}
        onChange={({ leaf, opens, resaw, leanDeg }) =>
          editor.run((document) => changeSizes(document, { ...face, leaf, opens, resaw, leanDeg }))
        }
      />
    </fieldset>
  );
}
