/** The board's photograph with its fronts, cuts and ruler. The photograph is embedded as it is; everything on it is drawn as vectors. */
import "server-only";
import { type CutStep, carpentersTriangle } from "@/lib/layout";
import type { OrderSnapshot, SnapshotBoard } from "@/lib/schemas/order-snapshot";
import type { OrderStep } from "@/lib/schemas/order-steps";
import { labelRanges } from "@/lib/words/part-name";
import { drawCasedLine, type PagePoint } from "./marks";
import type { BoardPicture } from "./print-order";
import { drawRuler, rulerHeight } from "./ruler";
import type { Sheet } from "./sheet";
import { black, putText, widthOfText } from "./typeface";

const highest = 170;
/** Right of the board, for the numbers of the rips. */
const numberRoom = 18;
const tagStyle = { face: "measure", size: 8 } as const;
const numberStyle = { face: "measure", size: 7.5 } as const;
/** Two rows of numbers above the board, so that two close crosscuts can both have theirs. */
const numberRows = [0, 8] as const;
const numberHeight = 22;

/** Where the board lies on the page. */
interface Drawing {
  readonly doc: PDFKit.PDFDocument;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly pointsPerUm: number;
}

export function boardPictureHeight(sheet: Sheet, board: SnapshotBoard): number {
  return numberHeight + board.width * scaleOf(sheet, board) + 3 + rulerHeight + 6;
}

function scaleOf({ width }: Sheet, board: SnapshotBoard): number {
  return Math.min((width - numberRoom) / board.length, highest / board.width);
}

/** At `sheet.y`, which it moves below the ruler. Call it with room for `boardPictureHeight`. */
export function drawBoardPicture(
  sheet: Sheet,
  snapshot: OrderSnapshot,
  board: SnapshotBoard,
  steps: readonly OrderStep[],
  picture: BoardPicture | undefined,
): void {
  const { doc, left } = sheet;
  const pointsPerUm = scaleOf(sheet, board);
  const size = { width: board.length * pointsPerUm, height: board.width * pointsPerUm };
  const drawing: Drawing = { doc, x: left, y: sheet.y + numberHeight, ...size, pointsPerUm };
  if (picture) doc.image(Buffer.from(picture.jpeg), drawing.x, drawing.y, size);
  doc.lineWidth(0.7).rect(drawing.x, drawing.y, size.width, size.height).stroke(black);
  drawZones(drawing, board);
  drawGlueLines(drawing, board);
  drawCuts(drawing, steps);
  drawFronts(drawing, snapshot, board);
  const place = { x: left, y: drawing.y + size.height + 3, pointsPerWoodMm: pointsPerUm * 1000 };
  drawRuler(doc, board.length, snapshot.units, place);
  sheet.y = place.y + rulerHeight + 6;
}

const pageFrom = ({ x, y, pointsPerUm }: Drawing, point: PagePoint): PagePoint => ({
  x: x + point.x * pointsPerUm,
  y: y + point.y * pointsPerUm,
});

/** Usable outline and keep-clear areas, thin: they explain why the fronts lie where they do. */
function drawZones(drawing: Drawing, board: SnapshotBoard): void {
  const { doc } = drawing;
  doc.save().rect(drawing.x, drawing.y, drawing.width, drawing.height).clip();
  const outlines = board.keepClear.map(({ area }) => (area.shape === "polygon" ? area.points : ellipsePoints(area)));
  for (const points of board.outline ? [...outlines, board.outline] : outlines) {
    const corners = points.map((point) => pageFrom(drawing, point));
    for (const [i, corner] of corners.entries())
      drawCasedLine(doc, corner, corners[(i + 1) % corners.length] ?? corner, 0.5, 1.5);
  }
  doc.restore();
}

/** Dotted and thin, because nothing is cut along them; of a blank yet to be glued up, each strip says whose it is. */
function drawGlueLines(drawing: Drawing, { glueLines = [], gluing, length }: SnapshotBoard): void {
  const { doc } = drawing;
  for (const across of glueLines)
    drawCasedLine(doc, pageFrom(drawing, { x: 0, y: across }), pageFrom(drawing, { x: length, y: across }), 0.6, 1.2);
  for (const { tag, rect } of gluing?.members ?? []) {
    const corner = pageFrom(drawing, { x: rect.x + rect.width, y: rect.y + rect.height / 2 });
    const wide = widthOfText(doc, tag, tagStyle) + 5;
    // At the right end, where the labels of the fronts do not stand.
    doc.rect(corner.x - wide - 2, corner.y - 5, wide, 10).fillAndStroke("#ffffff", black);
    putText(doc, tag, tagStyle, { x: corner.x - wide + 0.5, y: corner.y - 4, width: wide });
  }
}

type Ellipse = Extract<SnapshotBoard["keepClear"][number]["area"], { shape: "ellipse" }>;

function ellipsePoints({ centre, radiusX, radiusY, turnDeg }: Ellipse): PagePoint[] {
  const turn = (turnDeg * Math.PI) / 180;
  return Array.from({ length: 32 }, (_, i) => {
    const angle = (i / 32) * 2 * Math.PI;
    const [along, across] = [radiusX * Math.cos(angle), radiusY * Math.sin(angle)];
    return {
      x: centre.x + along * Math.cos(turn) - across * Math.sin(turn),
      y: centre.y + along * Math.sin(turn) + across * Math.cos(turn),
    };
  });
}

type Cut = Extract<OrderStep, { kind: "cut" }>;

/** Every cut through the middle of what the blade takes, with the number of its step where there is room for it. */
function drawCuts(drawing: Drawing, steps: readonly OrderStep[]): void {
  const cuts: readonly Cut[] = steps.filter((step) => step.kind === "cut");
  for (const { cut } of cuts) {
    const [from, to] = middleOf(cut);
    drawCasedLine(drawing.doc, pageFrom(drawing, from), pageFrom(drawing, to), 0.8, cut.kind === "true" ? 4 : undefined);
  }
  const ends = numberRows.map(() => Number.NEGATIVE_INFINITY);
  for (const { at, numbers } of closeTogether(drawing, cuts)) putAbove(drawing, at, labelRanges(numbers), ends);
  let lowest = Number.NEGATIVE_INFINITY;
  const byHeight = [...cuts].sort((a, b) => a.cut.kerf.y - b.cut.kerf.y || a.number - b.number);
  for (const { cut, number } of byHeight.filter((step) => !isAcross(step.cut))) {
    const at = pageFrom(drawing, middleOf(cut)[1]);
    const y = Math.max(at.y - 4, lowest);
    lowest = y + 8;
    putText(drawing.doc, String(number), numberStyle, { x: drawing.x + drawing.width + 3, y, width: numberRoom });
  }
}

/** Crosscuts so close that their numbers would cover each other share one place: the cut and the sliver after it. */
function closeTogether(
  drawing: Drawing,
  cuts: readonly Cut[],
): readonly { readonly at: PagePoint; readonly numbers: readonly string[] }[] {
  const across = cuts
    .filter(({ cut }) => isAcross(cut))
    .map(({ cut, number }) => ({ at: { x: pageFrom(drawing, middleOf(cut)[0]).x, y: drawing.y }, number }))
    .sort((a, b) => a.at.x - b.at.x || a.number - b.number);
  const groups: { at: PagePoint; numbers: number[] }[] = [];
  for (const { at, number } of across) {
    const last = groups.at(-1);
    if (last && at.x - last.at.x < 6) last.numbers.push(number);
    else groups.push({ at, numbers: [number] });
  }
  return groups.map(({ at, numbers }) => ({ at, numbers: numbers.sort((a, b) => a - b).map(String) }));
}

/** `at` on the page, at the upper edge of the board; left out where both rows are taken there. */
function putAbove({ doc }: Drawing, at: PagePoint, number: string, ends: number[]): void {
  const width = widthOfText(doc, number, numberStyle);
  const row = ends.findIndex((end) => at.x - width / 2 > end + 1.5);
  const up = numberRows[row];
  if (up === undefined) return;
  ends[row] = at.x + width / 2;
  doc
    .lineWidth(0.4)
    .moveTo(at.x, at.y - up - 3.5)
    .lineTo(at.x, at.y)
    .stroke(black);
  putText(doc, number, numberStyle, { x: at.x - width / 2, y: at.y - up - 13.5, width: width + 1 });
}

/** Runs across the board: a crosscut, or an end that is squared. */
function isAcross({ kind, fromEdge }: CutStep): boolean {
  return kind === "crosscut" || (kind === "true" && (fromEdge === "left" || fromEdge === "right"));
}

function middleOf(cut: CutStep): [PagePoint, PagePoint] {
  const { x, y, width, height } = cut.kerf;
  if (isAcross(cut))
    return [
      { x: x + width / 2, y },
      { x: x + width / 2, y: y + height },
    ];
  return [
    { x, y: y + height / 2 },
    { x: x + width, y: y + height / 2 },
  ];
}

/** Each front's label in a white field, and its part of the triangle. */
function drawFronts(drawing: Drawing, snapshot: OrderSnapshot, board: SnapshotBoard): void {
  const { doc, pointsPerUm } = drawing;
  const here = new Set(board.pieces.map(({ pieceId }) => pieceId));
  for (const { layout } of snapshot.faces) {
    for (const { piece, segments } of carpentersTriangle(layout)) {
      if (!here.has(piece)) continue;
      for (const { inWood } of segments) {
        if (inWood) drawCasedLine(doc, pageFrom(drawing, inWood.from), pageFrom(drawing, inWood.to), 0.8, 3);
      }
    }
  }
  for (const { label, rect } of board.pieces) {
    const corner = pageFrom(drawing, rect);
    const [width, height] = [rect.width * pointsPerUm, rect.height * pointsPerUm];
    const full = { face: "title", size: Math.min(13, height * 0.5) } as const;
    const fits = Math.min(1, (width - 7) / (widthOfText(doc, label, full) + 3));
    const size = full.size * fits;
    // Too small to be read: the numbers of the cuts and the diagram still tell it.
    if (size < 4.5) continue;
    const style = { ...full, size };
    const wide = widthOfText(doc, label, style) + 4;
    doc.rect(corner.x + 2.5, corner.y + 3, wide, size + 2).fillAndStroke("#ffffff", black);
    putText(doc, label, style, { x: corner.x + 4.5, y: corner.y + 3.2 + (size + 2 - size * 1.2) / 2 + 0.6, width: wide });
  }
}
