/** What the bench is told of a resawn pair beside the cuts. Lengths in µm. */
import type { Um } from "../../units/um";
import type { FaceLayout } from "../face-layout";
import { type WoodNeeded, woodNeeded } from "../wood-needed";
import { jumpOfLean, roughThickness, thicknessLoss } from "./resawn-losses";

export interface ResawnPlan {
  readonly wood: WoodNeeded;
  /** Of the stock, before any planing. */
  readonly roughThickness: Um;
  /** Between the two faces that show: kerf and the planing of both. */
  readonly thicknessLoss: Um;
  /** How far the figure jumps at the seam, across the grain; null while nobody knows how the figure leans. */
  readonly jump: Um | null;
}

/** null for a face of another pattern. */
export function resawnPlan(layout: FaceLayout): ResawnPlan | null {
  const { face } = layout;
  if (face.pattern !== "resawn") return null;
  return {
    wood: woodNeeded(layout),
    roughThickness: roughThickness(face),
    thicknessLoss: thicknessLoss(face),
    jump: jumpOfLean(face),
  };
}
