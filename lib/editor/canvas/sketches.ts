/** Sketches by name on one canvas: made when first asked for, kept while asked for, taken off when no longer. */
import type { StaticCanvas } from "fabric";
import { Sketch } from "./sketch";

export class Sketches {
  readonly #canvas: StaticCanvas;
  #present = new Map<string, Sketch>();
  #asked: Sketch[] = [];

  constructor(canvas: StaticCanvas) {
    this.#canvas = canvas;
  }

  /** The sketch of that name. Sketches lie over each other in the order they are asked for. `mayCache` counts when it is made. */
  named(name: string, mayCache = false): Sketch {
    const sketch = this.#present.get(name) ?? new Sketch(mayCache);
    this.#present.set(name, sketch);
    this.#asked.push(sketch);
    return sketch;
  }

  /** Ends a round of asking. */
  settle(): void {
    const asked = this.#asked;
    this.#asked = [];
    const before = this.#canvas.getObjects();
    if (before.length === asked.length && before.every((sketch, index) => sketch === asked[index])) return;
    const kept = new Set(asked);
    for (const [name, sketch] of this.#present) if (!kept.has(sketch)) this.#present.delete(name);
    this.#canvas.remove(...before);
    this.#canvas.add(...asked);
  }
}
