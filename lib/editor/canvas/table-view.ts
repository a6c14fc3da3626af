/**
 * The layout table on the screen: two sides in two places of the page, painted from the editor's state once a frame at most, and a hand on them. Holds no
 * state that matters: everything is painted again from the document.
 */
import type { LengthStyle } from "@/lib/layout";
import type { Editor } from "../editor";
import type { Store } from "../store";
import { currentGeometry } from "../view/current-geometry";
import type { Size } from "../view/geometry";
import type { ViewState } from "../view/view-state";
import type { Side } from "../view/zoom";
import { createFrameClock } from "./frame-clock";
import { listenToPointers } from "./pointer-input";
import { TableHand } from "./table-hand";
import { TablePainter } from "./table-painter";

export interface TableViewOptions {
  readonly hosts: Readonly<Record<Side, HTMLElement>>;
  readonly editor: Editor;
  readonly viewState: Store<ViewState>;
  readonly style: LengthStyle;
}

export interface TableView {
  /** Drops a drag in progress; false when there was none. */
  readonly cancel: () => boolean;
  readonly zoomBy: (factor: number) => void;
  /** Frees everything. The places in the page are empty when the promise resolves. */
  readonly dispose: () => Promise<void>;
}

export function mountTableView({ hosts, editor, viewState, style }: TableViewOptions): TableView {
  const geometry = currentGeometry(editor, viewState);
  const clock = createFrameClock(
    () => hand.takeLastMove(),
    () => {
      const now = geometry.now();
      if (now) painter.paint(editor.get(), viewState.get(), now);
    },
  );
  const painter = new TablePainter(hosts, style, clock.ask);
  const hand = new TableHand({ hosts, editor, viewState, geometry, askFrame: clock.ask });

  const measure = () => {
    const sides = { show: sizeOf(hosts.show), stock: sizeOf(hosts.stock) };
    painter.resize(sides);
    viewState.set({ ...viewState.get(), sides });
  };
  const resizes = new ResizeObserver(measure);
  resizes.observe(hosts.show);
  resizes.observe(hosts.stock);
  measure();

  const stops = [
    editor.subscribe(clock.ask),
    viewState.subscribe(clock.ask),
    listenToPointers(hosts.show, "show", hand),
    listenToPointers(hosts.stock, "stock", hand),
  ];
  // Labels are painted in letters that may still be on their way.
  document.fonts.ready.then(clock.ask);
  clock.ask();

  return {
    cancel: () => hand.cancel(),
    zoomBy(factor) {
      const { stock } = viewState.get().sides ?? {};
      if (stock) hand.onZoom("stock", factor, { x: stock.width / 2, y: stock.height / 2 });
    },
    async dispose() {
      for (const stop of stops) stop();
      resizes.disconnect();
      clock.stop();
      await painter.dispose();
    },
  };
}

function sizeOf(host: HTMLElement): Size {
  return { width: Math.max(1, host.clientWidth), height: Math.max(1, host.clientHeight) };
}
