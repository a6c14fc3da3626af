"use client";
/** One line of the seam list. */
import { useUnits } from "@/components/shell/units";
import type { SeamRelation } from "@/lib/editor/selectors/seam-relation";
import { jumpOf } from "@/lib/editor/view/jump-chips";
import { printedLength, type Seam, type UmRange } from "@/lib/layout";
import type { SeamReadingOnWire } from "@/lib/schemas/figure";
import { matchFigure } from "@/lib/words/seam-reading";

interface Props {
  seam: Seam;
  relation: SeamRelation;
  reading: SeamReadingOnWire | null;
  /** False: the reading belongs to an earlier state of the layout. */
  fresh: boolean;
  onOpen: () => void;
}

export function SeamRow({ seam, relation, reading, fresh, onOpen }: Props) {
  const { style } = useUnits();
  return (
    <tr className="border-t border-rule hover:bg-chalk-wash">
      <td className="py-0.5">
        <button
          type="button"
          onClick={onOpen}
          aria-label={`Seam between ${seam.a.slice(1)} and ${seam.b.slice(1)}, magnify`}
          className="min-h-8 text-left font-sans font-normal whitespace-nowrap text-chalk underline-offset-2 hover:underline"
        >
          {seam.a.slice(1)} and {seam.b.slice(1)}
        </button>
      </td>
      <td className="text-right">{printedLength(seam.gap, style).figure}</td>
      <JumpCells seam={seam} relation={relation} />
      <ReadingCells reading={reading} fresh={fresh} />
    </tr>
  );
}

const sayings: Readonly<Record<Exclude<SeamRelation, "runs-on">, string>> = {
  "no-wood": "no wood yet",
  "other-wood": "other wood",
  turned: "turned",
};

function JumpCells({ seam, relation }: Pick<Props, "seam" | "relation">) {
  const { style } = useUnits();
  const figure = (range: UmRange) => printedLength(jumpOf(range), style).figure;
  if (relation !== "runs-on" || seam.jump === null) {
    return (
      <td colSpan={2} className="text-right font-sans font-normal text-pencil">
        {sayings[relation === "runs-on" ? "other-wood" : relation]}
      </td>
    );
  }
  return (
    <>
      <td className="text-right">{figure(seam.jump.along)}</td>
      <td className="text-right">{figure(seam.jump.across)}</td>
    </>
  );
}

function ReadingCells({ reading, fresh }: Pick<Props, "reading" | "fresh">) {
  const { style } = useUnits();
  const look = fresh ? "text-right" : "text-right text-pencil";
  if (reading === null) return <td data-read colSpan={3} className={look} />;
  const { figure, tone } = reading;
  return (
    <>
      {figure.kind === "read" ? (
        <>
          <td data-read className={look}>
            {printedLength(figure.step, style).figure}
          </td>
          <td data-read className={look}>
            {matchFigure(figure.match)}
          </td>
        </>
      ) : (
        <td data-read colSpan={2} className={`${look} font-sans font-normal text-pencil`}>
          <CannotTell />
        </td>
      )}
      <td data-read className={look}>
        {tone === null ? "–" : tone.toFixed(1)}
      </td>
    </>
  );
}

const CannotTell = () => (
  <>
    <span aria-hidden="true" className="text-xs leading-none">
      can’t tell
    </span>
    <span className="sr-only">cannot tell</span>
  </>
);
