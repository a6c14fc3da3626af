"use client";

/** Stands in when even the outermost layout failed, so it brings its own page and style. */
export default function GlobalError({ reset }: { reset: () => void }) {
  return (
    <html lang="en">
      <body style={{ font: "16px/1.5 system-ui, sans-serif", background: "#eef0ee", color: "#20262a", padding: "4rem 1.5rem" }}>
        <h1>Something went wrong on our side</h1>
        <p>Nothing you had saved is lost.</p>
        <button type="button" onClick={reset}>
          Try again
        </button>
      </body>
    </html>
  );
}
