/**
 * The keys of the table. Those without Ctrl or Command work only while the table itself has the focus, so that nobody sets them off by speaking or
 * typing elsewhere.
 */
import type { Editor } from "@/lib/editor/editor";
import { ZOOM_STEP } from "@/lib/editor/view/zoom";
import { selectAllOrNone, type TableActions } from "./table-actions";

export interface KeyHelp {
  readonly keys: string;
  readonly does: string;
}

export const keyHelp: readonly KeyHelp[] = [
  { keys: "Tab", does: "the next front" },
  { keys: "← → ↑ ↓", does: "slide what is chosen by the smallest step, with Shift by ten of them" },
  { keys: "Space", does: "keep the front in focus chosen and go on to others; take it out again" },
  { keys: "A", does: "choose all fronts, or none" },
  { keys: "T", does: "turn end for end" },
  { keys: "S", does: "swap two chosen fronts" },
  { keys: "L", does: "let loose" },
  { keys: "B", does: "back into the set" },
  { keys: "M", does: "carpenter's triangle on or off" },
  { keys: "G", does: "direction of the grain on or off" },
  { keys: "+  −  0", does: "nearer, further, everything" },
  { keys: "Escape", does: "drop a drag, or choose nothing" },
  { keys: "Ctrl Z, Ctrl Shift Z", does: "undo, redo" },
  { keys: "?", does: "this list" },
];

export interface KeyTargets {
  readonly actions: TableActions;
  readonly editor: Editor;
  readonly zoomBy: (factor: number) => void;
  /** Drops a drag; false when there was none. */
  readonly cancelDrag: () => boolean;
  readonly help: () => void;
}

type KeyPress = Pick<KeyboardEvent, "key" | "shiftKey" | "ctrlKey" | "metaKey" | "altKey">;

/** Does what a key on the table stands for; false when it stands for nothing. */
export function pressKey(press: KeyPress, { actions, editor, zoomBy, cancelDrag, help }: KeyTargets): boolean {
  if (press.ctrlKey || press.metaKey || press.altKey) return false;
  switch (press.key) {
    case "ArrowLeft":
      actions.nudge("left", press.shiftKey);
      return true;
    case "ArrowRight":
      actions.nudge("right", press.shiftKey);
      return true;
    case "ArrowUp":
      actions.nudge("up", press.shiftKey);
      return true;
    case "ArrowDown":
      actions.nudge("down", press.shiftKey);
      return true;
    case "+":
    case "=":
      zoomBy(ZOOM_STEP);
      return true;
    case "-":
      zoomBy(1 / ZOOM_STEP);
      return true;
    case "0":
      actions.seeAll();
      return true;
    case "?":
      help();
      return true;
    case "Escape":
      if (!cancelDrag()) editor.select([]);
      return true;
  }
  const letters: Readonly<Record<string, () => void>> = {
    a: () => selectAllOrNone(editor),
    t: actions.turn,
    s: actions.swap,
    l: actions.letLoose,
    b: actions.takeBack,
    m: actions.toggleTriangle,
    g: actions.toggleGrain,
  };
  const letter = letters[press.key.toLowerCase()];
  letter?.();
  return letter !== undefined;
}

/** Undo and redo by the usual keys; false for any other. */
export function pressUndoKey(press: KeyPress, actions: Pick<TableActions, "undo" | "redo">): boolean {
  if (!(press.ctrlKey || press.metaKey) || press.altKey) return false;
  const key = press.key.toLowerCase();
  if (key === "z") {
    if (press.shiftKey) actions.redo();
    else actions.undo();
    return true;
  }
  if (key !== "y") return false;
  actions.redo();
  return true;
}
