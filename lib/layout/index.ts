/** The one door of the layout core: everything other rooms may use, and nothing else. */
export type { Problem } from "./fit/problem";
export type { Isometry } from "./frame/isometry";
export { identity } from "./frame/isometry";
export type { FacePoint, FaceRect, Frame, Point, Rect, StockPoint, StockRect } from "./frame/point";
export type {
  AnchorX,
  AnchorY,
  CutLoss,
  FaceLayout,
  Grain,
  GridFace,
  PieceGroup,
  Placement,
  QuarterTurns,
  Spacing,
} from "./pattern/face-layout";
export type { Piece, PieceId, StockId } from "./piece";
export type {
  Caution,
  CleanUp,
  Conservation,
  CutKind,
  CutProgram,
  CutProgramOutcome,
  CutStep,
  Edge,
  EdgeState,
  Part,
  PartKind,
  ShopLimits,
} from "./program/program";
export type { Seam, UmRange } from "./seam/seam";
export type { BoardFace, KeepClear, KeepClearKind, KeepClearShape } from "./stock/board";
export type { Um } from "./units/um";
export { mmFromUm, um, umFromMm } from "./units/um";
