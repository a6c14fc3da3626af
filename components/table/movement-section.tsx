"use client";
import { useUnits } from "@/components/shell/units";
import { Notice } from "@/components/ui/notice";
import { facePieces, type MovementWarning } from "@/lib/layout";
import { movementWarningSentence } from "@/lib/words/movement";
import { MovementGaps } from "./movement-gaps";
import { MovementPlace } from "./movement-place";
import { MovementSurround } from "./movement-surround";
import { MovementWoods } from "./movement-woods";
import { PanelSection } from "./panel-section";
import { type Movement, useMovement } from "./use-movement";
import { useTagOf } from "./use-tag-of";

export function MovementSection() {
  const { movement, error } = useMovement();
  return (
    <PanelSection title="Movement through the year" beside={movement ? summaryOf(movement) : null} open={false}>
      {error && !movement && <Notice kind="stop">What is known of the wood could not be read. {error.message}</Notice>}
      {movement && <MovementParts movement={movement} />}
    </PanelSection>
  );
}

function MovementParts({ movement }: { movement: Movement }) {
  if (!mayOpenAndClose(movement)) {
    return (
      <p className="text-sm text-pencil">This face has no gaps that open and close: its pieces meet at joints and corners.</p>
    );
  }
  return (
    <>
      <Warnings movement={movement} />
      <MovementGaps movement={movement} />
      <MovementPlace movement={movement} />
      <MovementWoods movement={movement} />
      <MovementSurround movement={movement} />
      <p className="text-xs text-pencil">
        Each front is held at its middle; those places go along with what stands round the fronts. Along the grain wood is taken
        as still. One board may differ a lot from the figures of its species, and wood lags behind the air.
      </p>
    </>
  );
}

/** Fronts may have a gap round them that nobody has entered yet; a run or a pair has its joints and nothing else. */
function mayOpenAndClose({ request, outcome }: Movement): boolean {
  return outcome.gaps.length > 0 || facePieces(request.layout).some(({ role }) => role === "front");
}

/** What stops, before what is only to be minded. */
const stops: readonly MovementWarning["kind"][] = ["closes", "too-damp"];

function Warnings({ movement: { request, outcome } }: { movement: Movement }) {
  const { style } = useUnits();
  const tagOf = useTagOf();
  if (outcome.warnings.length === 0) return null;
  return (
    <ul className="flex flex-col gap-2" aria-label="Warnings of movement">
      {outcome.warnings.map((warning) => (
        <li
          key={JSON.stringify([warning.kind, "stockId" in warning && warning.stockId, "season" in warning && warning.season])}
          className={`rounded-sm border-l-4 px-3 py-2 text-sm ${
            stops.includes(warning.kind) ? "border-crayon bg-crayon-wash" : "border-tape bg-tape-wash"
          }`}
        >
          {movementWarningSentence(warning, request, style, tagOf)}
        </li>
      ))}
    </ul>
  );
}

/** In a word, for the section folded away. */
function summaryOf(movement: Movement): string {
  if (!mayOpenAndClose(movement)) return "no gaps";
  const { gaps, warnings } = movement.outcome;
  const has = (...kinds: MovementWarning["kind"][]) => warnings.some(({ kind }) => kinds.includes(kind));
  if (has("closes")) return "a gap closes";
  if (has("too-narrow")) return "a gap too narrow";
  if (has("not-on-wood")) return "not on wood";
  if (has("no-species", "no-reading", "too-damp")) return "wood not known";
  if (warnings.length > 0) return "see warnings";
  return gaps.length === 0 ? "no gaps" : "gaps stay open";
}
