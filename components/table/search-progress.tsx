"use client";
/** How far a search is, with a way to stop it. */
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { ProgressTape } from "@/components/ui/progress-tape";
import { messageOf } from "@/lib/client/fault-from-server";
import type { WoodSearchState } from "./use-wood-search";

export function SearchProgress({ state }: { state: WoodSearchState }) {
  const { search, running, error } = state;
  return (
    <div className="flex flex-col gap-2">
      {running && (
        <div className="flex items-center gap-3">
          <div className="grow">
            <ProgressTape label="Searching" done={Math.round((search?.progress ?? 0) * 100)} of={100} />
          </div>
          <Button size="small" onClick={state.stop} disabled={search === null}>
            Stop
          </Button>
        </div>
      )}
      {search?.state === "cancelled" && <p className="text-sm text-pencil">Stopped. What was found until then stays.</p>}
      {search?.state === "failed" && <Notice kind="stop">{search.failure ?? "The search failed. Start it again."}</Notice>}
      {error !== null && error !== undefined && <Notice kind="stop">{messageOf(error)}</Notice>}
    </div>
  );
}
