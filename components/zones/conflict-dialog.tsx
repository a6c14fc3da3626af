"use client";
import type { Zones } from "@/lib/schemas/zones";
import { Button } from "../ui/button";
import { Modal } from "../ui/modal";
import type { ZonesSaving } from "./use-save-zones";
import type { ZonesDoc } from "./zones-doc";

/** Two people drew at once: whose drawing stays. */
export function ConflictDialog({ saving, mine }: { saving: ZonesSaving; mine: ZonesDoc }) {
  const { theirs } = saving;
  return (
    <Modal
      open={theirs !== null}
      onOpenChange={(open) => !open && saving.decideLater()}
      title="Somebody else saved this drawing meanwhile"
      lead="Nothing of yours is lost yet. Choose which drawing the board keeps."
    >
      {theirs && (
        <>
          <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1">
            <dt>Yours</dt>
            <dd>{summary(mine)}</dd>
            <dt>Theirs</dt>
            <dd>{summary(theirs)}</dd>
          </dl>
          <div className="mt-5 flex flex-wrap gap-2">
            <Button kind="primary" disabled={saving.saving} onClick={saving.keepMine}>
              Keep mine, replace theirs
            </Button>
            <Button disabled={saving.saving} onClick={saving.takeTheirs}>
              Take theirs
            </Button>
          </div>
          <p className="mt-3 text-sm text-pencil">After taking theirs, Undo brings yours back on the screen.</p>
        </>
      )}
    </Modal>
  );
}

function summary({ outline, keepClear }: ZonesDoc | Zones): string {
  const areas = `${keepClear.length} keep-clear ${keepClear.length === 1 ? "area" : "areas"}`;
  return `${outline ? `outline with ${outline.length} corners` : "the whole board usable"}, ${areas}`;
}
