/** The face as it will stand, with the carpenter's triangle across its fronts. */
import { carpentersTriangle, type FaceLayout, facePieces, faceSize, mmFromUm } from "@/lib/layout";

export function FaceView({ layout, title, className = "" }: { layout: FaceLayout; title: string; className?: string }) {
  const size = faceSize(layout.face);
  const [width, height] = [mmFromUm(size.width), mmFromUm(size.height)];
  const rim = Math.max(width, height) * 0.01;
  return (
    <svg
      role="img"
      aria-label={`${title} as seen from the show side, with the triangle across all fronts`}
      viewBox={`${-rim} ${-rim} ${width + 2 * rim} ${height + 2 * rim}`}
      className={`block w-full ${className}`}
    >
      {facePieces(layout).map(({ id, label, rect }) => {
        const letter = Math.min(mmFromUm(rect.height) * 0.4, mmFromUm(rect.width) * 0.5, height * 0.3);
        return (
          <g key={id}>
            <rect
              x={mmFromUm(rect.x)}
              y={mmFromUm(rect.y)}
              width={mmFromUm(rect.width)}
              height={mmFromUm(rect.height)}
              fill="#fbfcfb"
              stroke="#20262a"
              strokeWidth="1.2"
              vectorEffect="non-scaling-stroke"
            />
            <text
              x={mmFromUm(rect.x) + letter * 0.25}
              y={mmFromUm(rect.y) + letter}
              fontSize={letter}
              className="measure"
              fill="#1d4f91"
            >
              {label}
            </text>
          </g>
        );
      })}
      <path
        d={carpentersTriangle(layout)
          .flatMap(({ segments }) => segments)
          .map(({ from, to }) => `M${mmFromUm(from.x)} ${mmFromUm(from.y)}L${mmFromUm(to.x)} ${mmFromUm(to.y)}`)
          .join("")}
        fill="none"
        stroke="#1d4f91"
        strokeWidth="2"
        strokeDasharray="6 4"
        vectorEffect="non-scaling-stroke"
      />
    </svg>
  );
}
