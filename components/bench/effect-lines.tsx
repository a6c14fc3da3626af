/** What entries come to, as it is worked out while they are typed. */
import { effectHeadline, type RestEffect } from "@/lib/words/rest-effect";
import { Notice } from "../ui/notice";

export function EffectLines({ effect }: { effect: RestEffect }) {
  const lines = [...effect.faults, ...effect.troubles];
  return (
    <Notice kind={effect.faults.length > 0 ? "stop" : lines.length > 0 ? "care" : "sound"}>
      <p className="text-base font-semibold">{effectHeadline(effect)}</p>
      {lines.length > 0 && (
        <ul className="mt-1 flex flex-col gap-1 text-base">
          {lines.map((line) => (
            <li key={line}>{line}</li>
          ))}
        </ul>
      )}
    </Notice>
  );
}
