"use client";
/** A run round corners as it will stand: every side textured from its photograph and stood up in space by the page's own three dimensions. */
import { type CSSProperties, useId, useRef, useState } from "react";
import { FacePicture } from "@/components/picture/face-picture";
import { usePictures } from "@/components/picture/use-pictures";
import { useSize } from "@/components/picture/use-size";
import { factsOf } from "@/lib/editor/selectors/facts";
import { type FaceLayout, type FoldedSide, wrapPlan } from "@/lib/layout";
import { foldFrame } from "./fold-frame";
import { useEditorState } from "./table-context";

/** The eye looks down on the run a little, so that the corners show. Degrees. */
const TILT = -22;
const HEIGHT_PX = 260;

export function FoldedView({ layout }: { layout: FaceLayout }) {
  const plan = wrapPlan(layout);
  const ref = useRef<HTMLDivElement>(null);
  const room = useSize(ref);
  const [turn, setTurn] = useState(-28);
  const slider = useId();
  if (plan === null || layout.face.pattern !== "wrap") return null;
  const frame = foldFrame(plan.fold, layout.face.height, { width: room.width, height: HEIGHT_PX });
  return (
    <div className="flex flex-col gap-1">
      <div
        ref={ref}
        role="img"
        aria-label={`The run folded: ${plan.fold.length} sides`}
        className="relative overflow-hidden rounded-md border border-rule bg-paper"
        style={{ height: HEIGHT_PX, perspective: 900 }}
      >
        {room.width > 0 && (
          <div
            className="absolute top-1/2 left-1/2 transform-3d"
            style={{ transform: `rotateX(${TILT}deg) rotateY(${turn}deg) translate3d(${frame.shift})` }}
          >
            <Sides layout={layout} fold={plan.fold} pxPerMm={frame.pxPerMm} />
            <TopEdge fold={plan.fold} pxPerMm={frame.pxPerMm} heightPx={frame.heightPx} />
          </div>
        )}
      </div>
      <label htmlFor={slider} className="text-sm">
        Turn the view
      </label>
      <input
        id={slider}
        type="range"
        min={-180}
        max={180}
        step={2}
        value={turn}
        onChange={(event) => setTurn(Number(event.target.value))}
        aria-valuetext={`${turn} degrees`}
        className="min-h-6 accent-chalk"
      />
    </div>
  );
}

function Sides({ layout, fold, pxPerMm }: { layout: FaceLayout; fold: readonly FoldedSide[]; pxPerMm: number }) {
  const atHand = usePictures();
  const boards = useEditorState((state) => state.boards);
  const rects = new Map(factsOf(layout).facePieces.map(({ id, rect }) => [id, rect]));
  return fold.map(({ piece, directionDeg, show }) => {
    const rect = rects.get(piece);
    if (!rect) return null;
    const [x, z] = [(show.from.x / 1000) * pxPerMm, (-show.from.y / 1000) * pxPerMm];
    const size = { width: (rect.width / 1000) * pxPerMm, height: (rect.height / 1000) * pxPerMm };
    const place: CSSProperties = {
      ...size,
      top: -size.height / 2,
      transformOrigin: "0 50%",
      transform: `translate3d(${x}px, 0, ${z}px) rotateY(${directionDeg}deg)`,
    };
    return (
      <div key={piece} className="absolute left-0 transform-3d" style={place}>
        <div className="absolute inset-0 backface-hidden">
          <FacePicture
            label={`Side ${piece.slice(1)}`}
            layout={layout}
            boards={boards}
            view={rect}
            pxPerMm={pxPerMm}
            atHand={atHand}
          />
          <span className="absolute top-1 left-1 rounded-xs bg-graphite/80 px-1 font-measure text-xs text-white">
            {piece.slice(1)}
          </span>
        </div>
        {/* The inner face, which no photograph shows. */}
        <div className="absolute inset-0 border border-line bg-rule backface-hidden" style={{ transform: "rotateY(180deg)" }} />
      </div>
    );
  });
}

/** The upper edges of all sides, so that thickness and corners can be seen. */
function TopEdge({ fold, pxPerMm, heightPx }: { fold: readonly FoldedSide[]; pxPerMm: number; heightPx: number }) {
  const at = ({ x, y }: FoldedSide["show"]["from"]) => `${(x / 1000) * pxPerMm},${(y / 1000) * pxPerMm}`;
  return (
    <svg
      aria-hidden="true"
      width={1}
      height={1}
      className="absolute top-0 left-0 overflow-visible"
      style={{ transformOrigin: "0 0", transform: `translate3d(0, ${-heightPx / 2}px, 0) rotateX(-90deg)` }}
    >
      {fold.map(({ piece, show, inner }) => (
        <polygon
          key={piece}
          points={[show.from, show.to, inner.to, inner.from].map(at).join(" ")}
          className="fill-sheet stroke-graphite"
          strokeWidth={1}
        />
      ))}
    </svg>
  );
}
