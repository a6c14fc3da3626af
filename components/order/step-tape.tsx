/** Progress as a place on a tape: one mark a step, figures every five, done up to where the shade ends. */

interface Props {
  steps: number;
  /** Ticked steps by their place from 0. */
  done: readonly boolean[];
  /** The step in hand, from 0; null where none is. */
  at: number | null;
  className?: string;
}

const heightPx = 26;

export function StepTape({ steps, done, at, className = "" }: Props) {
  const every = figureEvery(steps);
  const places = done.flatMap((ticked, place) => (ticked ? [place] : []));
  const percent = (place: number) => `${(place / steps) * 100}%`;
  return (
    <div
      role="progressbar"
      aria-label="Steps done"
      aria-valuemin={0}
      aria-valuemax={steps}
      aria-valuenow={places.length}
      aria-valuetext={`${places.length} of ${steps} steps done`}
      className={`relative h-[26px] bg-tape text-graphite ${className}`}
    >
      <svg aria-hidden="true" width="100%" height={heightPx} className="absolute inset-0">
        {places.map((place) => (
          <rect key={place} x={percent(place)} width={percent(1.02)} height={heightPx} fill="#2f6b4a" fillOpacity="0.32" />
        ))}
        {Array.from({ length: steps - 1 }, (_, i) => i + 1).map((mark) => (
          <line
            key={mark}
            x1={percent(mark)}
            x2={percent(mark)}
            y1={heightPx}
            y2={heightPx - (mark % every === 0 ? 13 : 7)}
            stroke="#20262a"
          />
        ))}
      </svg>
      {Array.from({ length: Math.floor((steps - 1) / every) }, (_, i) => (i + 1) * every).map((mark) => (
        <span
          key={mark}
          className="measure absolute top-0 -ml-6 w-5 text-right text-xs"
          style={{ left: percent(mark) }}
          aria-hidden="true"
        >
          {mark}
        </span>
      ))}
      {at !== null && (
        <svg
          aria-hidden="true"
          viewBox="0 0 16 12"
          className="absolute bottom-0 -ml-2 h-3 w-4"
          style={{ left: percent(at + 0.5) }}
        >
          <path d="M8 12 0 0H16Z" fill="#b93021" />
        </svg>
      )}
    </div>
  );
}

/** About eight figures on a phone. */
function figureEvery(steps: number): number {
  return [5, 10, 20, 50, 100, 200, 500].find((every) => steps / every <= 8) ?? 1000;
}
