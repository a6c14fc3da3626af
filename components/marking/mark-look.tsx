/** How each kind of mark is drawn, told apart by shape as well as colour; 44 × 44 with the point in the middle, which stays open. */
import type { MarkId } from "./marks";

const shapes: Readonly<Record<MarkId["of"], string>> = {
  board: "M22 12a10 10 0 1 0 0.01 0z",
  sheet: "M13 13h18v18h-18z",
  extra: "M22 11l11 11l-11 11l-11 -11z",
  edge: "M22 14l7 13h-14z",
  known: "M22 14a8 8 0 1 0 0.01 0z",
};
/** The middle of the triangle lies lower than its box. */
const cross = "M22 18v3m0 2v3M18 22h3m2 0h3";

export function MarkLook({ mark, selected, unplaced }: { mark: MarkId; selected: boolean; unplaced: boolean }) {
  const color = mark.of === "known" ? "var(--color-graphite)" : "var(--color-chalk)";
  return (
    <svg width="44" height="44" aria-hidden="true" className="overflow-visible">
      <path d={shapes[mark.of]} fill="none" stroke="#fff" strokeWidth={selected ? 7 : 5} />
      <path
        d={shapes[mark.of]}
        fill="none"
        stroke={color}
        strokeWidth={selected ? 4 : 2.25}
        strokeDasharray={unplaced ? "4 3" : undefined}
      />
      <path d={cross} stroke="#fff" strokeWidth="3" />
      <path d={cross} stroke={color} strokeWidth="1.25" />
    </svg>
  );
}
