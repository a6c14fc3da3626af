"use client";
import { Modal } from "@/components/ui/modal";
import { keyHelp } from "./table-keys";

export function HelpDialog({ open, onOpenChange }: { open: boolean; onOpenChange: (open: boolean) => void }) {
  return (
    <Modal
      open={open}
      onOpenChange={onOpenChange}
      title="At the layout table"
      lead="Drag fronts on the stock side and watch the show side change."
    >
      <ul className="mb-4 flex list-disc flex-col gap-1 pl-5 text-sm">
        <li>A front belongs to the set, and the set slides as one. Let a front loose to slide it alone.</li>
        <li>
          Edges are drawn to the end of a board, to the rim of a keep-clear area and to the saw’s loss from a neighbour. Hold Alt
          to stop that.
        </li>
        <li>Hold Shift while dragging to stay in line. Shift and click adds a front to what is chosen.</li>
        <li>The wheel or two fingers bring the wood nearer; drag beside the fronts to move it.</li>
      </ul>
      <h3 className="mb-2 text-lg">Keys</h3>
      <p className="mb-2 text-sm text-pencil">They work while the table has the focus: click it, or reach it with Tab.</p>
      <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1 text-sm">
        {keyHelp.map(({ keys, does }) => (
          <div key={keys} className="contents">
            <dt className="measure">{keys}</dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
    </Modal>
  );
}
