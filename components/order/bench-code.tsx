/** The way to the bench for a phone: a code to scan, and the same address as a link. */

export interface BenchQr {
  readonly url: string;
  /** Modules along a side. */
  readonly size: number;
  readonly runs: readonly { readonly x: number; readonly y: number; readonly length: number }[];
}

/** Modules that must stay white around a code. */
const quiet = 4;

export function BenchCode({ qr: { url, size, runs } }: { qr: BenchQr }) {
  return (
    <section>
      <h2 className="mb-2 text-lg">At the bench</h2>
      <div className="flex items-center gap-3">
        <svg
          role="img"
          aria-label="Code that opens this order at the bench"
          viewBox={`${-quiet} ${-quiet} ${size + 2 * quiet} ${size + 2 * quiet}`}
          className="w-36 shrink-0 bg-white"
          shapeRendering="crispEdges"
        >
          <path d={runs.map(({ x, y, length }) => `M${x} ${y}h${length}v1h${-length}z`).join("")} />
        </svg>
        <p className="min-w-0 text-sm">
          Scan it with a phone that is signed in, or{" "}
          <a href={url} className="text-chalk underline">
            open the bench here
          </a>
          .
        </p>
      </div>
    </section>
  );
}
