/**
 * Draws at most once a frame, and tells the browser's timeline how long taking in the input and drawing took, so that tools and tests can see it. The mark is
 * cleared at once: observers have it, and a day at the table does not fill the memory.
 */
export const FRAME_MEASURE = "layout table frame";

export interface FrameClock {
  readonly ask: () => void;
  readonly stop: () => void;
}

/** `takeInput` may ask for a frame as anything else may; the one at hand serves it. */
export function createFrameClock(takeInput: () => void, draw: () => void): FrameClock {
  let asked = 0;
  let taking = false;
  let stopped = false;
  const frame = () => {
    const start = performance.now();
    asked = 0;
    taking = true;
    takeInput();
    taking = false;
    draw();
    performance.measure(FRAME_MEASURE, { start, end: performance.now() });
    performance.clearMeasures(FRAME_MEASURE);
  };
  return {
    ask() {
      if (!stopped && !taking) asked ||= requestAnimationFrame(frame);
    },
    stop() {
      stopped = true;
      cancelAnimationFrame(asked);
    },
  };
}
