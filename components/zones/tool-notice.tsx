"use client";
import { Button } from "../ui/button";
import { Notice } from "../ui/notice";
import { FEWEST_CORNERS } from "./polygon-edit";
import type { ZonesState } from "./use-zones";

const words = {
  outline: "Tap the corners of the usable wood one after the other. Near the board's edges they snap.",
  polygon: "Tap the corners of the area one after the other.",
  "glue-line": "Tap where the boards are glued together. The line goes through the whole blank.",
  ellipse: "Drag a box around the area, or tap its middle.",
} as const;

/** What the tool in hand waits for, and the ways out of it. */
export function ToolNotice({ zones }: { zones: ZonesState }) {
  const { tool, traced } = zones;
  if (tool === "select") return null;
  return (
    <Notice kind="care">
      <p>
        {words[tool]}{" "}
        <span className="pointer-coarse:hidden">With the keyboard: move the picture under the cross-hair and press Enter.</span>
        <span className="pointer-fine:hidden">Two fingers move the picture.</span>
      </p>
      <div className="mt-2 flex flex-wrap gap-2">
        {tool !== "ellipse" && tool !== "glue-line" && (
          <>
            <Button size="small" kind="primary" disabled={traced.length < FEWEST_CORNERS} onClick={zones.closeTrace}>
              Close it, {traced.length} corners
            </Button>
            <Button size="small" disabled={traced.length === 0} onClick={zones.dropLastCorner}>
              Take back the last
            </Button>
          </>
        )}
        <Button size="small" onClick={() => zones.take("select")}>
          Cancel
        </Button>
      </div>
    </Notice>
  );
}
