/**
 * The one kind of object on the table's canvases: a box in CSS pixels that paints itself. Fabric keeps the order, the retina scale, the panning and, where
 * asked, a cached picture of the box that is painted again only when the box says it is dirty. Nothing is ever read back from it.
 */
import { FabricObject } from "fabric";

export interface Box {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

/** Paints with the origin at the top left corner of the box. */
export type Paint = (context: CanvasRenderingContext2D, box: Box) => void;

/** A cached box larger than this costs more memory than the painting saves, px². */
const LARGEST_CACHE_PX = 1_500_000;

export class Sketch extends FabricObject {
  static override type = "Sketch";
  #box: Box = { left: 0, top: 0, width: 0, height: 0 };
  #paint: Paint = () => {};
  readonly #mayCache: boolean;

  constructor(mayCache = false) {
    // Fabric 7 places objects by their centre unless told otherwise.
    super({ originX: "left", originY: "top", strokeWidth: 0, selectable: false, evented: false, objectCaching: false });
    this.#mayCache = mayCache;
  }

  /** Puts the box somewhere and has it painted afresh: straight on the canvas, since what changes now may change again with the next frame. */
  put(box: Box, paint: Paint): this {
    this.#box = box;
    this.#paint = paint;
    this.set({ ...box, objectCaching: false, dirty: true });
    this.setCoords();
    return this;
  }

  /** Moves the box as it is painted. What has stayed the same for a frame is kept as a picture, where that was asked for. */
  shift(left: number, top: number): void {
    this.#box = { ...this.#box, left, top };
    const objectCaching = this.#mayCache && this.#box.width * this.#box.height < LARGEST_CACHE_PX;
    this.set({ left, top, objectCaching });
    this.setCoords();
  }

  override _render(context: CanvasRenderingContext2D): void {
    // The context of a cached picture is used again and again, and nobody else puts it back.
    context.save();
    context.translate(-this.#box.width / 2, -this.#box.height / 2);
    this.#paint(context, this.#box);
    context.restore();
  }
}
