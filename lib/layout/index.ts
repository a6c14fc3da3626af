/** The one door of the layout core: everything other rooms may use, and nothing else. */
export { type GrainField, grainField } from "./figure/grain-field";
export { type PictureOf, readSeams } from "./figure/read-seams";
export type { CannotTell, MeanColour, SeamFigure, SeamReading } from "./figure/seam-reading";
export type { StockPicture } from "./figure/stock-picture";
export { type KeepClearSuggestion, suggestKeepClear } from "./figure/suggest-keep-clear";
export { type Kerfs, kerfsOf } from "./fit/apart";
export { type Clearance, clearances } from "./fit/clearance";
export { LEAST_GLUE_LINE } from "./fit/glue-line";
export { type LyingPiece, lyingPieces } from "./fit/lying-piece";
export { overBoardBy } from "./fit/on-board";
export { outsideBy, usableOutline } from "./fit/outline";
export type { Problem } from "./fit/problem";
export { problems, type ShopAsks } from "./fit/problems";
export { leastSlide } from "./fit/slide";
export { type Snap, type SnappedSlide, type SnapTarget, snapSlide } from "./fit/snap";
export { type Spans, spansOf } from "./fit/span";
export { type WoodTaken, woodTaken } from "./fit/spoken-for";
export { boundsOf, polygonToStock, rectToStock, toFace, toStock } from "./frame/apply-isometry";
export { composed, inverted, quarterTurn, turnedVector } from "./frame/combine-isometries";
export type { Isometry } from "./frame/isometry";
export { identity } from "./frame/isometry";
export type { FacePoint, FaceRect, Frame, Point, Rect, StockPoint, StockRect } from "./frame/point";
export { type Climate, defaultClimate, type YearlyMoisture, yearlyMoisture } from "./movement/climate";
export { type Air, equilibriumMoisture } from "./movement/equilibrium-moisture";
export type { FaceGap, FaceSide } from "./movement/face-gaps";
export { faceMovement } from "./movement/face-movement";
export { knownSpecies } from "./movement/known-species";
export { matchSpecies, type SpeciesMatch } from "./movement/match-species";
export type {
  BoardWood,
  FaceMovement,
  GapFigures,
  GapThroughYear,
  MovementRequest,
  MovementWarning,
  Season,
} from "./movement/movement";
export { canEvenGaps, type RecommendedGap, recommendedGap, roundedUp, withRecommendedGap } from "./movement/recommended-gap";
export {
  COEFFICIENT_RANGE,
  coefficientAt,
  FIBRE_SATURATION,
  ringAngleOfCut,
  strainAcross,
  type WoodMovement,
} from "./movement/size-change";
export type { Species, SpeciesSource } from "./movement/species";
export { type Surround, sheetAtMost } from "./movement/surround";
export { type BoardFacts, noWoodChoice, type WoodChoice, type WoodOfBoard, woodOfBoard } from "./movement/wood-of-board";
export { changeAnchor } from "./pattern/change-anchor";
export { changeCuts, changeFace, type FaceChange } from "./pattern/change-face";
export { faceSize, seamPlaces } from "./pattern/charts";
export { cleanUpEdges } from "./pattern/clean-up-edges";
export {
  addDivider,
  type CutOutChange,
  type CutOutRefusal,
  LEAST_LEFT,
  moveDivider,
  moveRow,
  moveStrip,
  type PartPlace,
  removePart,
} from "./pattern/cut-out/change-cut-out";
export { type CutOutPiece, piecesOfCutOut } from "./pattern/cut-out/cut-out-pieces";
export {
  type CutOutCrosscut,
  type CutOutOpening,
  type CutOutPlan,
  cutOutPlan,
  type GluingShift,
  type TrimmedFront,
} from "./pattern/cut-out/cut-out-plan";
export { type CutOutWish, type FreshCutOut, freshCutOut } from "./pattern/cut-out/fresh-cut-out";
export type {
  CutOutFace,
  CutOutPart,
  CutOutRow,
  EdgeAmounts,
  Face,
  Grain,
  GridFace,
  Pattern,
  ResawnFace,
  WrapCorner,
  WrapFace,
} from "./pattern/face";
export type { FaceFault } from "./pattern/face-fault";
export type {
  AnchorX,
  AnchorY,
  CutLoss,
  FaceLayout,
  PieceGroup,
  Placement,
  QuarterTurns,
  Spacing,
} from "./pattern/face-layout";
export { type CutChoices, freshLayout, gridFace, rowFace, SET_ID, stackFace } from "./pattern/fresh-layout";
export {
  type Graduated,
  type Graduation,
  MOST_FRONTS,
  type Opening,
  type SizeStep,
  sizesFromOpening,
  WHOLE_MICROMETRES,
} from "./pattern/graduate";
export { type FacePiece, facePieces, layOut, unplacedPieces } from "./pattern/lay-out";
export { groupById, type LayoutChange, type LayoutRefusal, type PieceSize } from "./pattern/layout-change";
export { faceFaults, type LayoutFault, layoutFaults } from "./pattern/layout-faults";
export { letLoose, regroup } from "./pattern/let-loose";
export { type CutDirection, cutBetween, jumpAcrossGap, lossOf, sliverOf, spacingOf } from "./pattern/loss";
export type { HungPiece, Mirrored, SeamPlace } from "./pattern/pattern-rules";
export { pieceCount, pieceIdsOf, readingIndexOf } from "./pattern/piece-ids";
export { labelAt, pieceIdAt } from "./pattern/piece-names";
export { groupBounds, liftGroup, moveGroup, placeGroup, turnGroup, turnsAlongGrain } from "./pattern/place-group";
export { acrossProfile } from "./pattern/resawn/across-profile";
export { type AcrossProfile, type LeanReading, leanFromFaces } from "./pattern/resawn/lean-from-faces";
export { type ResawnPlan, resawnPlan } from "./pattern/resawn/resawn-plan";
export { groupOf } from "./pattern/slots";
export { swapPieces } from "./pattern/swap-pieces";
export { type WoodNeeded, woodNeeded } from "./pattern/wood-needed";
export type { FoldedSide, PlanPoint } from "./pattern/wrap/fold";
export { freshWrap } from "./pattern/wrap/fresh-wrap";
export { type WrapCornerPlan, type WrapEnd, type WrapPlan, type WrapSidePlan, wrapPlan } from "./pattern/wrap/wrap-plan";
export type { LensOutcome } from "./picture/fit-lens";
export { fitMarking, type MarkingFit, type MarkResidual } from "./picture/fit-marking";
export type { MmPoint, PhotoPoint } from "./picture/homography";
export type { PhotoSize } from "./picture/lens";
export type { BoardEdge, EdgePoint, ExtraPoint, FourCorners, Marking, MarkingReference } from "./picture/marking";
export type { CornerIndex, MarkedRectangle, MarksRefusal } from "./picture/marks-check";
export type { OutputScale } from "./picture/output-scale";
export { type BlankScale, blankScale, type MemberPicture, paintStrip } from "./picture/paint-strip";
export { type PaperName, type PaperSize, paperSizes } from "./picture/paper-sizes";
export { measureMm, type PhotoGeometry, photoFromStockMm, stockMmFromPhoto, warpMapAt } from "./picture/photo-geometry";
export { type PhotoPart, photoPartFor, windowOf } from "./picture/photo-part";
export { type LevelSize, pyramidLevels } from "./picture/pyramid";
export { plainSampler, type Sampler, stepped } from "./picture/sampler";
export { LARGEST_ROOM, type Pixels, type WarpMap, warpInBands } from "./picture/warp";
export type { Piece, PieceId, PieceRole, StockId } from "./piece";
export { type ConservationLine, conservationLine, type WoodSum } from "./program/conservation-line";
export {
  type BoardEdges,
  boardEdges,
  type CutRequest,
  defaultCutBudget,
  type PlacedPiece,
  type RoughAllowances,
} from "./program/cut-request";
export { type CutMachines, type Machine, type MachineKind, type MachineLimits, noLimits } from "./program/machine";
export { cutRefusal, planCuts } from "./program/plan-cuts";
export {
  bladeOf,
  type Caution,
  type CleanUp,
  type Conservation,
  type CutKind,
  type CutProgram,
  type CutProgramOutcome,
  type CutStep,
  type Edge,
  type EdgeState,
  isSawn,
  type Part,
  type PartKind,
  type SearchReport,
  type ShopLimits,
  type StepKind,
  THINNEST_SAWN,
} from "./program/program";
export { type ReplayFault, type ReplayOutcome, replay } from "./program/replay";
export { cutRequestFor, type PieceOnBoard, piecesOnBoard } from "./program/request-for-board";
export { type Verdict, verifyProgram } from "./program/verify-program";
export type { AsCutEntry, EntryFault, KerfReach } from "./replan/as-cut";
export { assessRest, type RestAssessment, type RestOutcome } from "./replan/assess-rest";
export { carryOut, type RestFault } from "./replan/carry-out";
export type { Missing } from "./replan/fit-in-part";
export { followWood, type WoodMove } from "./replan/follow-rest";
export {
  type PartInHand,
  type RestLimits,
  type RestPiece,
  type RestRequest,
  wholeBoardInHand,
} from "./replan/part-in-hand";
export { planRest, type RestPlan, type RestPlanOutcome } from "./replan/plan-rest";
export { stepsThatHold } from "./replan/steps-that-hold";
export {
  type PieceChange,
  type PieceName,
  type Rescue,
  type RescueChoices,
  type RescueKind,
  rescueKinds,
  type Trouble,
  type TroubleFact,
} from "./replan/trouble";
export { type RestVerdict, verifyRest } from "./replan/verify-rest";
export { crossesGlueLine, type GlueLineCrossing } from "./seam/crosses-glue-line";
export { type Drift, drifts } from "./seam/drift";
export type { Seam, UmRange } from "./seam/seam";
export { seams } from "./seam/seams";
export type { BoardSide, LeastOffcut, SideName } from "./search/board-side";
export { comparePlaces, NOTABLE, type PartChange, type PlaceComparison } from "./search/compare-places";
export type { LooseGrid, LooseRequest } from "./search/loose-request";
export type { LooseValue } from "./search/loose-value";
export type { NoPlace } from "./search/no-place";
export { defaultWeights, type PartName, type Parts, partNames, totalOf, type Weights } from "./search/objective";
export type { PlaceRequest } from "./search/place-request";
export type { Obstacle } from "./search/place-table";
export type { PlaceValue, SeamValue } from "./search/place-value";
export type { PresentPlace } from "./search/present-place";
export { isSettled, rankStock, type StockResult, searchOrder, stockBound, stockResult } from "./search/rank-stock";
export { type Apart, defaultApart } from "./search/really-differ";
export type { SeamsLeftOut } from "./search/seam-plan";
export { type LoosePlace, type LooseSearch, type NoRun, searchLoose } from "./search/search-loose";
export { type SearchPicture, searchPicture } from "./search/search-picture";
export { type FoundPlace, type GroupPlace, type PlaceSearch, searchPlaces } from "./search/search-places";
export { runSlices, type Slices } from "./search/slices";
export { type StockFacts, type StockLeftOut, type StockWish, stockLeftOut } from "./search/stock-left-out";
export type { BlankMember, BlankPlan, MemberPlace, PlacedMember } from "./stock/blank/blank-plan";
export { type BlankJoint, type BlankStrip, blankStrips, type StripLayout, type StripOutcome } from "./stock/blank/blank-strips";
export {
  type BlankArea,
  type BlankGlueLine,
  type BlankOutcome,
  type BlankRefusal,
  type ComposedBlank,
  composeBlank,
  THICKNESS_TOLERANCE,
} from "./stock/blank/compose-blank";
export type { BoardFace, KeepClear, KeepClearKind, KeepClearShape, SpokenFor } from "./stock/board";
export { carryGlueLines, liesWithin } from "./stock/carry-glue-lines";
export { type CarriedOutline, carryOutline, liesOnBoard } from "./stock/carry-zones";
export { movedArea, movedPoint, movedPolygon } from "./stock/move-area";
export { otherSideFrom, SIDES_AGREE, type SidesCheck, sidesCheck, turnedOver } from "./stock/other-side";
export { type BoardSize, outsideFault, type PolygonFault, polygonFault } from "./stock/polygon-fault";
export {
  carpentersTriangle,
  TRIANGLE_INSET,
  type TriangleBase,
  type TriangleMark,
  type TriangleSegment,
  type TriangleSide,
  triangleCorners,
} from "./triangle/carpenters-triangle";
export type { InchDenominator, LengthStyle } from "./units/length-style";
export { boardFeet, boardFeetByRule } from "./units/lumber";
export { type NominalThickness, nominalThicknesses, nominalThicknessOf } from "./units/nominal-thickness";
export { type BareUnit, LONGEST_UM, type ParsedLength, parseLength } from "./units/parse-length";
export { type PrintedLength, printedLength, printLength } from "./units/print-length";
export { ruleStepOf } from "./units/rule-step";
export type { Um } from "./units/um";
export { mmFromUm, um, umFromMm } from "./units/um";
