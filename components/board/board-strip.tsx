/** A board to scale: its picture, or hatching of its size while there is none. Fills the width it is given; its height follows. */
import Image from "next/image";
import type { BoardRow } from "@/lib/schemas/board";

type Shown = Pick<BoardRow, "length" | "width" | "picture">;

const hatched =
  "flex items-center pl-3 bg-[repeating-linear-gradient(135deg,var(--color-rule)_0_2px,transparent_2px_9px)] border border-line bg-sheet";

const waiting = <span className="bg-sheet px-1.5 text-xs text-pencil">no picture yet</span>;

export function BoardStrip({ board, lazy = true }: { board: Shown; lazy?: boolean }) {
  const { length, width, picture } = board;
  if (length === 0 || width === 0) {
    return <span className={`${hatched} h-14 w-44 max-w-full border-dashed`}>{waiting}</span>;
  }
  const shape = { aspectRatio: `${length} / ${width}` };
  if (picture === null) {
    return (
      <span className={`${hatched} w-full`} style={shape}>
        {waiting}
      </span>
    );
  }
  return (
    <Image
      unoptimized
      src={picture.url}
      alt=""
      width={picture.widthPx}
      height={picture.heightPx}
      loading={lazy ? "lazy" : "eager"}
      className="block w-full bg-rule object-fill"
      style={shape}
    />
  );
}
