"use client";
import { Moment } from "@/components/shell/moment";
import { useUnits } from "@/components/shell/units";
import { resolutionText } from "@/components/ui/resolution-text";
import type { Straightening } from "@/lib/schemas/straightening";

interface Props {
  versions: readonly Straightening[];
  faceId: string | null;
  backId: string | null;
}

const stateWords = { waiting: "in the making", done: "", failed: "failed", cancelled: "stopped" } as const;

/** Every version of the pictures of both sides. Layouts stay on the one they were made on. */
export function Versions({ versions, faceId, backId }: Props) {
  const { print, style } = useUnits();
  if (versions.length === 0) return <p className="text-pencil">None yet.</p>;
  return (
    <ol className="divide-y divide-rule text-sm">
      {versions.map((version) => (
        <li key={version.id} className="flex flex-wrap items-baseline gap-x-4 py-1.5">
          <span className="measure text-base">Version {version.version}</span>
          {version.side === "back" && <span>back</span>}
          {version.photoId === null && <span>composed</span>}
          {version.id === faceId && <span className="text-moss">shown in the rack</span>}
          {version.id === backId && <span className="text-moss">shown as its back</span>}
          <span className="text-pencil">{stateWords[version.state]}</span>
          {version.state === "done" && (
            <span className="measure">
              {print(version.length)} × {print(version.width)}, {resolutionText(version.pxPerMm, style)}
              {version.residual !== null && version.residual > 0 && `, marks agree to ${print(version.residual)}`}
            </span>
          )}
          <span className="measure ml-auto text-pencil">
            <Moment at={version.createdAt} />
          </span>
        </li>
      ))}
    </ol>
  );
}
