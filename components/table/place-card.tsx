"use client";
/** One place that is offered: what the face would look like, what it is better and worse at, and what it leaves. */
import type { PicturesAtHand } from "@/components/picture/use-pictures";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import type { PaintedBoard } from "@/lib/editor/canvas/paint-face";
import type { FaceLayout, PartName } from "@/lib/layout";
import { placeParts } from "@/lib/schemas/place-parts";
import type { FoundPlaceOnWire } from "@/lib/schemas/wood-search";
import { partWords, shareFigure } from "@/lib/words/wood-search";
import { PlacePicture } from "./place-picture";

interface Props {
  title: string;
  place: FoundPlaceOnWire;
  layout: FaceLayout;
  boards: readonly PaintedBoard[];
  atHand: PicturesAtHand | null;
  onTake: (() => void) | null;
  without?: readonly PartName[];
}

export function PlaceCard({ title, place, layout, boards, atHand, onTake, without = [] }: Props) {
  const { print } = useUnits();
  const { leaves, against, parts } = place;
  return (
    <li className="flex flex-col gap-2 border-t border-rule py-3 first:border-t-0">
      <div className="flex flex-wrap items-baseline justify-between gap-2">
        <h3 className="text-lg">
          {title} <span className="measure ml-1 text-base text-pencil">{shareFigure(place.total)} of 100</span>
        </h3>
        {onTake && (
          <Button size="small" kind="primary" onClick={onTake}>
            Lay it here
          </Button>
        )}
      </div>
      <PlacePicture label={`${title}: the show side`} layout={layout} boards={boards} atHand={atHand} />
      <p className="text-sm">
        At {print(place.corner.x)} from the left end and {print(place.corner.y)} from the upper edge
        {place.side === "back" && ", on the back"}.{" "}
        {leaves ? `Leaves ${print(leaves.width)} × ${print(leaves.height)} in one piece.` : "Leaves nothing worth keeping."}
      </p>
      {against && <Against against={against} likePresent={place.likePresent} />}
      <dl className="flex flex-wrap gap-x-4 text-sm text-pencil">
        {placeParts
          .filter((part) => parts[part] !== null && !without.includes(part))
          .map((part) => (
            <div key={part} className="flex gap-1">
              <dt>{partWords[part].name}</dt>
              <dd className="measure">{shareFigure(parts[part] ?? 0)}</dd>
            </div>
          ))}
      </dl>
    </li>
  );
}

function Against({
  against: { better, worse },
  likePresent,
}: {
  against: NonNullable<Props["place"]["against"]>;
  likePresent: boolean;
}) {
  if (likePresent && better.length + worse.length === 0) return <p className="text-sm">As it lies now.</p>;
  const names = (changes: typeof better) => changes.map(({ part }) => partWords[part].name.toLowerCase()).join(", ");
  return (
    <p className="text-sm">
      {better.length > 0 && <span className="text-moss">Better: {names(better)}. </span>}
      {worse.length > 0 && <span className="text-crayon">Worse: {names(worse)}.</span>}
      {better.length + worse.length === 0 && "As good as it lies now, on other wood."}
    </p>
  );
}
