"use client";
/** What can be done at the table, once: buttons, keys and menus all share these. */
import { useMemo } from "react";
import { useUnits } from "@/components/shell/units";
import { changeGrain } from "@/lib/editor/commands/change-sizes";
import { letPiecesLoose, takePiecesBack } from "@/lib/editor/commands/loose";
import { liftFromBoard, placeOnBoard } from "@/lib/editor/commands/place";
import { slideGroups } from "@/lib/editor/commands/slide";
import { swapTwo } from "@/lib/editor/commands/swap";
import { turnEndForEnd } from "@/lib/editor/commands/turn";
import { type Editor, groupsInHand } from "@/lib/editor/editor";
import { nudgeStep } from "@/lib/editor/nudge-step";
import type { Store } from "@/lib/editor/store";
import { wholeView } from "@/lib/editor/view/geometry";
import type { ViewState } from "@/lib/editor/view/view-state";
import { type BoardFace, type LengthStyle, type PieceId, pieceIdsOf, type Um, um } from "@/lib/layout";
import { useTableContext } from "./table-context";

export type Direction = "left" | "right" | "up" | "down";

const steps: Readonly<Record<Direction, { readonly x: -1 | 0 | 1; readonly y: -1 | 0 | 1 }>> = {
  left: { x: -1, y: 0 },
  right: { x: 1, y: 0 },
  up: { x: 0, y: -1 },
  down: { x: 0, y: 1 },
};

export interface TableActions {
  readonly undo: () => void;
  readonly redo: () => void;
  readonly nudge: (direction: Direction, coarse: boolean) => void;
  readonly slideOf: (piece: PieceId, by: Um) => void;
  readonly turn: () => void;
  readonly swap: () => void;
  readonly letLoose: () => void;
  readonly takeBack: () => void;
  readonly lift: () => void;
  readonly layOn: (board: BoardFace) => void;
  readonly turnGrain: () => void;
  readonly toggleTriangle: () => void;
  readonly toggleGrain: () => void;
  readonly seeAll: () => void;
}

export function useTableActions(): TableActions {
  const { editor, viewState } = useTableContext();
  const { style } = useUnits();
  return useMemo(() => tableActions(editor, viewState, style), [editor, viewState, style]);
}

function tableActions(editor: Editor, viewState: Store<ViewState>, style: LengthStyle): TableActions {
  const inHand = () => groupsInHand(editor.get());
  const chosen = () => editor.get().selection;
  return {
    undo: editor.undo,
    redo: editor.redo,
    nudge(direction, coarse) {
      const { x, y } = steps[direction];
      const step = nudgeStep(style, coarse);
      const by = { x: um(x * step), y: um(y * step) };
      editor.run((document) => slideGroups(document, inHand(), by), `nudge ${direction} ${inHand().join(" ")}`);
    },
    slideOf(piece, by) {
      editor.select([piece]);
      editor.run((document) => slideGroups(document, inHand(), { x: by, y: um(0) }));
    },
    turn: () => editor.run((document) => turnEndForEnd(document, inHand())),
    swap: () => editor.run((document) => swapTwo(document, chosen())),
    letLoose: () => editor.run((document) => letPiecesLoose(document, chosen())),
    takeBack: () => editor.run((document) => takePiecesBack(document, chosen())),
    lift: () => editor.run((document) => liftFromBoard(document, inHand())),
    layOn: (board) => editor.run((document) => placeOnBoard(document, inHand(), board)),
    turnGrain() {
      editor.run((document) => changeGrain(document, document.layout.face.grain === "horizontal" ? "vertical" : "horizontal"));
    },
    toggleTriangle: () => viewState.set({ ...viewState.get(), showTriangle: !viewState.get().showTriangle }),
    toggleGrain: () => viewState.set({ ...viewState.get(), showGrain: !viewState.get().showGrain }),
    seeAll: () => viewState.set({ ...viewState.get(), view: wholeView }),
  };
}

/** Chooses every piece, or none when all are chosen. */
export function selectAllOrNone(editor: Editor): void {
  const { document, selection } = editor.get();
  const all = pieceIdsOf(document.layout.face);
  editor.select(selection.length === all.length ? [] : all);
}
