/** How a handle of a drawn shape looks; 44 × 44 with the point in the middle. */
const shapes = {
  corner: "M22 15a7 7 0 1 0 0.01 0z",
  middle: "M22 13v18M13 22h18",
  turn: "M28 17a8 8 0 1 0 2 6M29 11v6h-6",
};

export function HandleLook({ shape, selected = false }: { shape: keyof typeof shapes; selected?: boolean }) {
  const fill = shape !== "corner" ? "none" : selected ? "var(--color-chalk)" : "#fff";
  return (
    <svg width="44" height="44" aria-hidden="true">
      <path d={shapes[shape]} fill="none" stroke="#fff" strokeWidth="6" strokeLinejoin="round" />
      <path d={shapes[shape]} fill={fill} className="stroke-chalk" strokeWidth="2.5" />
    </svg>
  );
}
