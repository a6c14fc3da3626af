"use client";
/** The fronts as a list that is not seen: what is drawn on the canvases, for the keyboard and for those who hear the page. */
import { useRef } from "react";
import { useUnits } from "@/components/shell/units";
import { factsOf, piecesOfProblem, problemsOf } from "@/lib/editor/selectors/facts";
import type { TableBoard } from "@/lib/editor/table-board";
import { boundsOf, groupOf, type PieceId, polygonToStock, SET_ID, type StockRect } from "@/lib/layout";
import { spokenForWords } from "@/lib/words/held-by";
import { useEditorState, useTableContext } from "./table-context";

export function PieceList() {
  const choosing = useChoosing();
  const { print } = useUnits();
  const layout = useEditorState((state) => state.document.layout);
  const boards = useEditorState((state) => state.boards);
  const faces = useEditorState((state) => state.boardFaces);
  const selection = useEditorState((state) => state.selection);
  const { facePieces, pieces } = factsOf(layout);
  const trouble = new Set(problemsOf(layout, faces).flatMap(piecesOfProblem));
  const lying = new Map(pieces.map((piece) => [piece.id, piece]));

  const placeOn = ({ tag }: TableBoard, { x, y }: StockRect) =>
    `on board ${tag}, ${print(x)} from the left end, ${print(y)} from the edge`;
  const described = facePieces.map(({ id, label, rect }) => {
    const piece = lying.get(id);
    const board = piece && boards.find(({ face }) => face.id === piece.stockId);
    const at = piece && boundsOf(polygonToStock(piece.stockFromFace, piece.outline));
    const where = at && board ? placeOn(board, at) : "no wood yet";
    const loose = groupOf(layout, id)?.id === SET_ID ? "" : ", loose";
    return {
      id,
      text: `Front ${label}, ${print(rect.width)} × ${print(rect.height)}, ${where}${loose}${trouble.has(id) ? ", see problems" : ""}`,
    };
  });
  const others = boards.flatMap((board) =>
    board.spokenFor.map((wood) => ({ id: wood.id, text: spokenForWords(wood, placeOn(board, wood.rect)) })),
  );
  return (
    <div className="sr-only">
      <ul aria-label="Fronts">
        {described.map(({ id, text }) => (
          <li key={id}>
            <button
              type="button"
              aria-pressed={selection.includes(id)}
              onFocus={() => choosing.reach(id)}
              onClick={() => choosing.press(id)}
            >
              {text}
            </button>
          </li>
        ))}
      </ul>
      {others.length > 0 && (
        <ul aria-label="Wood of other faces">
          {others.map(({ id, text }) => (
            <li key={id}>{text}</li>
          ))}
        </ul>
      )}
    </div>
  );
}

/**
 * Choosing by keyboard: the front in focus is the one chosen, until Space keeps it. From then on Tab only moves the focus and Space adds
 * or takes out, until nothing is chosen or something else has changed what is.
 */
function useChoosing() {
  const { editor } = useTableContext();
  const kept = useRef<readonly PieceId[] | null>(null);
  const isKept = () => kept.current === editor.get().selection;
  return {
    reach(id: PieceId) {
      if (!isKept() && !editor.get().selection.includes(id)) editor.select([id]);
    },
    press(id: PieceId) {
      const { selection } = editor.get();
      const onlyReached = selection.length === 1 && selection[0] === id;
      if (isKept() || !onlyReached) editor.toggle(id);
      const now = editor.get().selection;
      kept.current = now.length > 0 ? now : null;
    },
  };
}
