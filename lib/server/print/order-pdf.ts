/** The cut order on paper: what to fetch, each board with its drawing and steps, and the check of its wood. */
import "server-only";
import type { OrderSnapshot, SnapshotBoard } from "@/lib/schemas/order-snapshot";
import { doneBefore, type OrderStep, orderSteps } from "@/lib/schemas/order-steps";
import { styleOf } from "@/lib/words/order-step";
import { revisionLetter } from "@/lib/words/revision-letter";
import { woodCheck } from "@/lib/words/wood-check";
import { drawAlreadyCut } from "./already-cut";
import { boardPictureHeight, drawBoardPicture } from "./board-picture";
import { drawFetchBlock } from "./fetch-block";
import { drawFrames, drawHeading, drawRunningHead } from "./page-frame";
import type { Paper } from "./paper";
import type { BoardPicture, PrintOrder } from "./print-order";
import { breathe, closeDocument, makeRoom, openSheet, type Sheet } from "./sheet";
import { drawStepTable, tableStartHeight } from "./step-table";
import { grey, heightOfText, putText } from "./typeface";

const boardStyle = { face: "title", size: 14 } as const;
const checkStyle = { face: "words", size: 8.8, color: grey } as const;

/** The same order on the same paper gives the same bytes. */
export async function orderPdf(print: PrintOrder, paper: Paper): Promise<Uint8Array> {
  const { order } = print;
  const sheet = openSheet(paper, {
    title: `Cut order ${order.number} ${revisionLetter(order.revision)}: ${order.snapshot.job.title}`,
    author: order.snapshot.shop.name,
    at: new Date(order.issuedAt),
  });
  sheet.headPage = () => drawRunningHead(sheet, print);
  drawHeading(sheet, print);
  drawFetchBlock(sheet, order.snapshot);
  drawAlreadyCut(sheet, order.snapshot);
  await breathe();
  const steps = orderSteps(order.snapshot);
  for (const board of order.snapshot.boards) {
    const own = steps.filter((step) => step.board === board);
    await drawBoard(sheet, order.snapshot, board, own, print.pictures.get(board.straighteningId));
  }
  drawFrames(sheet, print);
  return closeDocument(sheet.doc);
}

async function drawBoard(
  sheet: Sheet,
  snapshot: OrderSnapshot,
  board: SnapshotBoard,
  steps: readonly OrderStep[],
  picture: BoardPicture | undefined,
): Promise<void> {
  const style = styleOf(snapshot);
  const several = snapshot.boards.length > 1;
  const title = several ? 22 : 0;
  makeRoom(sheet, title + boardPictureHeight(sheet, board) + tableStartHeight(sheet, steps, style));
  if (several) putText(sheet.doc, `Board ${board.tag}`, boardStyle, { x: sheet.left, y: sheet.y, width: sheet.width });
  sheet.y += title;
  drawBoardPicture(sheet, snapshot, board, steps, picture);
  await drawStepTable(sheet, steps, style, doneBefore(snapshot));
  drawCheck(sheet, woodCheck(board, style));
}

function drawCheck(sheet: Sheet, lines: readonly string[]): void {
  sheet.y += 8;
  for (const line of lines) {
    const height = heightOfText(sheet.doc, line, checkStyle, { width: sheet.width });
    makeRoom(sheet, height);
    putText(sheet.doc, line, checkStyle, { x: sheet.left, y: sheet.y, width: sheet.width });
    sheet.y += height + 2;
  }
  sheet.y += 14;
}
