"use client";
/** Everything known of one seam, in words. */
import type { ReactNode } from "react";
import { useUnits } from "@/components/shell/units";
import type { SeamRelation } from "@/lib/editor/selectors/seam-relation";
import { jumpOf } from "@/lib/editor/view/jump-chips";
import { cutBetween, type Drift, type Face, type Seam, type UmRange } from "@/lib/layout";
import type { SeamReadingOnWire } from "@/lib/schemas/figure";
import { cannotTellWords, matchFigure, toneWords } from "@/lib/words/seam-reading";

interface Props {
  seam: Seam;
  relation: SeamRelation;
  reading: SeamReadingOnWire | null;
  face: Face;
  /** Of the second piece. */
  drift: Drift["drift"];
}

export function SeamFacts({ seam, relation, reading, face, drift }: Props) {
  const { print } = useUnits();
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1.5 text-sm">
      <Fact name="Gap">{print(seam.gap)}</Fact>
      <Fact name="Jump">{jumpWords(seam, relation, (range) => print(jumpOf(range)))}</Fact>
      <Fact name="Drift">
        {drift === null
          ? "cannot be told: the second does not lie as the set does"
          : `the figure of ${seam.b.slice(1)} has wandered ${print(driftAlongSeam(seam, face, drift))} from the anchor`}
      </Fact>
      {reading && (
        <>
          <Fact name="Step">{stepWords(seam, reading, print)}</Fact>
          {reading.figure.kind === "read" && (
            <Fact name="Match">
              {matchFigure(reading.figure.match)} of 100
              {Math.abs(reading.figure.step) > 0 && `, ${matchFigure(reading.figure.peak)} if the step were taken out`}
            </Fact>
          )}
          {reading.tone !== null && (
            <Fact name="Tone">
              {reading.tone.toFixed(1)}, {toneWords(reading.tone)}
            </Fact>
          )}
        </>
      )}
    </dl>
  );
}

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <>
      <dt className="text-pencil">{name}</dt>
      <dd>{children}</dd>
    </>
  );
}

function jumpWords(seam: Seam, relation: SeamRelation, print: (range: UmRange) => string): string {
  if (relation === "no-wood") return "One of the two does not lie on wood yet.";
  if (relation === "other-wood" || seam.jump === null) return "The two come from different boards: no figure runs on.";
  if (relation === "turned") return "One of the two is turned: the figure cannot run on.";
  return `${print(seam.jump.along)} along the grain, ${print(seam.jump.across)} across it`;
}

/** In the direction of the seam's normal. */
function driftAlongSeam({ normal }: Seam, face: Face, drift: NonNullable<Drift["drift"]>) {
  return cutBetween(normal === "right" ? "columns" : "rows", face.grain) === "crosscut" ? drift.along : drift.across;
}

function stepWords(seam: Seam, { figure }: SeamReadingOnWire, print: (length: Seam["gap"]) => string): string {
  if (figure.kind === "cannotTell") return `Cannot tell. ${cannotTellWords[figure.why]}`;
  const second = seam.b.slice(1);
  // The step of a seam that runs down the face is up or down, of one that runs along it left or right.
  const [back, on] = seam.normal === "right" ? ["higher", "lower"] : ["further left", "further right"];
  const size = print(Math.abs(figure.step) as Seam["gap"]);
  if (figure.step === 0) return "none: the lines meet";
  return `${size}: the lines of ${second} lie that much ${figure.step > 0 ? on : back}`;
}
