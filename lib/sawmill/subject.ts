/** What a photograph is taken of. */
import type { FacePicture } from "./picture";

/** The thing in front of the camera; `render` gives its face at a scale of the photographer's choosing. */
export interface Subject {
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly thicknessMm: number;
  /** A sheet of card lying on the face, as makers lay one there for scale. */
  readonly card?: Card;
  readonly render: (pxPerMm: number) => FacePicture;
}

/** An upright rectangle in the face frame, mm. */
export interface Card {
  readonly xMm: number;
  readonly yMm: number;
  readonly lengthMm: number;
  readonly widthMm: number;
}
