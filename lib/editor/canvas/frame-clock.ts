/**
 * Draws at most once a frame, and tells the browser's timeline how long the drawing took, so that tools and tests can see it. The mark is cleared at once:
 * observers have it, and a day at the table does not fill the memory.
 */
export const FRAME_MEASURE = "layout table frame";

export interface FrameClock {
  readonly ask: () => void;
  readonly stop: () => void;
}

export function createFrameClock(draw: () => void): FrameClock {
  let asked = 0;
  let stopped = false;
  const frame = () => {
    asked = 0;
    const start = performance.now();
    draw();
    performance.measure(FRAME_MEASURE, { start, end: performance.now() });
    performance.clearMeasures(FRAME_MEASURE);
  };
  return {
    ask() {
      if (!stopped) asked ||= requestAnimationFrame(frame);
    },
    stop() {
      stopped = true;
      cancelAnimationFrame(asked);
    },
  };
}
