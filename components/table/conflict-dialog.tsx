"use client";
/** Two windows changed the same fronts or settings: one of the two has to be kept. */
import { useRef } from "react";
import { Button } from "@/components/ui/button";
import { Modal } from "@/components/ui/modal";
import { useEditorState, useTableContext } from "./table-context";

export function ConflictDialog() {
  const { sync } = useTableContext();
  const status = useEditorState((state) => state.sync);
  const lastName = useRef("");
  if (status.kind === "conflict") lastName.current = status.theirs.updatedBy;
  return (
    <Modal
      open={status.kind === "conflict"}
      // There is no leaving it open: closing would go on without saving.
      onOpenChange={() => {}}
      title="Changed in another window"
      lead={`${lastName.current} saved changes to the same fronts or settings meanwhile. Keep one of the two.`}
    >
      <div className="flex flex-wrap gap-3">
        <Button kind="primary" onClick={() => sync.resolve("mine")}>
          Keep mine
        </Button>
        <Button onClick={() => sync.resolve("theirs")}>Take theirs</Button>
      </div>
      <p className="mt-3 text-sm text-pencil">
        Keeping yours saves it over theirs. Taking theirs gives up what is not saved here.
      </p>
    </Modal>
  );
}
