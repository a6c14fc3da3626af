import { facePieces, faceSize, type GridFace } from "@/lib/layout";

/** The fronts of a face as outlines, to scale, with their numbers. A drawing only: the wood is on the layout table. */
export function FaceDrawing({ face, className = "" }: { face: GridFace; className?: string }) {
  const { width, height } = faceSize(face);
  const pieces = facePieces({ face });
  const label = Math.max(Math.min(width, height * 2) / 8, 1);
  return (
    <svg
      viewBox={`${-width / 200} ${-width / 200} ${width * 1.01} ${height + width / 100}`}
      className={className}
      role="img"
      aria-label={`${pieces.length} fronts`}
    >
      {pieces.map(({ id, label: name, rect }) => (
        <g key={id}>
          <rect {...rect} className="fill-sheet stroke-graphite" strokeWidth={1.5} vectorEffect="non-scaling-stroke" />
          <text
            x={rect.x + rect.width / 2}
            y={rect.y + rect.height / 2}
            fontSize={Math.min(label, rect.height * 0.7, rect.width * 0.7)}
            textAnchor="middle"
            dominantBaseline="central"
            className="fill-graphite font-measure font-semibold"
          >
            {name}
          </text>
        </g>
      ))}
    </svg>
  );
}
