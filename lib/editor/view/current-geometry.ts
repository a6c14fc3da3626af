/** The geometry of the table as it stands, worked out once for each content, size and view. */
import type { Editor } from "../editor";
import type { Store } from "../store";
import { type TableGeometry, tableGeometry, type View } from "./geometry";
import type { ViewState } from "./view-state";

export interface CurrentGeometry {
  /** Null before the sides are on the screen. The same object as long as nothing that it depends on has changed. */
  readonly now: () => TableGeometry | null;
  /** Looks at the table in another way, moved no further than there is something to see. */
  readonly look: (view: View) => void;
}

export function currentGeometry(editor: Editor, viewState: Store<ViewState>): CurrentGeometry {
  let known: { readonly from: readonly unknown[]; readonly geometry: TableGeometry } | null = null;
  const content = () => {
    const { boardFaces, document } = editor.get();
    return { boards: boardFaces, face: document.layout.face };
  };
  return {
    now() {
      const { sides, view } = viewState.get();
      if (!sides) return null;
      const { boards, face } = content();
      const from = [sides, view, boards, face];
      if (!known || from.some((part, index) => part !== known?.from[index])) {
        known = { from, geometry: tableGeometry({ boards, face }, sides, view) };
      }
      return known.geometry;
    },
    look(view) {
      const state = viewState.get();
      if (state.sides) viewState.set({ ...state, view: tableGeometry(content(), state.sides, view).view });
    },
  };
}
