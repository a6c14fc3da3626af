"use client";
/** A front that cannot be used: which one, how much of its wood is still good, and at once where another can be cut. */
import { useState } from "react";
import { messageOf } from "@/lib/client/fault-from-server";
import { type Um, um } from "@/lib/layout";
import type { AsCutEntry } from "@/lib/schemas/as-cut";
import type { SnapshotBoard } from "@/lib/schemas/order-snapshot";
import { buttonClass } from "../ui/button";
import { Choice } from "../ui/choice";
import { Modal } from "../ui/modal";
import { EffectLines } from "./effect-lines";
import { TrueLength } from "./true-length";
import type { AsCutState } from "./use-as-cut";

interface Props {
  board: SnapshotBoard;
  /** Those that the step in hand is about come first. */
  about: readonly string[];
  asCut: AsCutState;
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

type Good = "none" | "left" | "right";

const goods: readonly { readonly value: Good; readonly label: string }[] = [
  { value: "none", label: "Nothing" },
  { value: "left", label: "From its left end" },
  { value: "right", label: "From its right end" },
];

export function SpoiledSheet({ open, onOpenChange, ...rest }: Props) {
  return (
    <Modal open={open} onOpenChange={onOpenChange} title="A spoiled front">
      {open && <SpoiledForm {...rest} onDone={() => onOpenChange(false)} />}
    </Modal>
  );
}

function SpoiledForm({ board, about, asCut, onDone }: Omit<Props, "open" | "onOpenChange"> & { onDone: () => void }) {
  const entered = new Set(
    asCut.asCut.flatMap(({ entry }) => (entry.kind === "spoiled" && entry.boardId === board.boardId ? [entry.pieceId] : [])),
  );
  const pieces = board.pieces.filter(({ pieceId }) => !entered.has(pieceId));
  const first = pieces.find(({ pieceId }) => about.includes(pieceId)) ?? pieces[0];
  const [pieceId, setPieceId] = useState(first?.pieceId ?? "");
  const [good, setGood] = useState<Good>("none");
  const [length, setLength] = useState<Um | null>(null);
  const piece = pieces.find((one) => one.pieceId === pieceId);
  if (!piece) return <p>Every front of this board is entered as spoiled already.</p>;
  const half = um(Math.round(piece.rect.width / 2));
  const usable = good === "none" ? null : { from: good, length: length ?? half };
  const entry: AsCutEntry = { kind: "spoiled", boardId: board.boardId, pieceId, usable };
  return (
    <form
      className="flex flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        asCut.save({ entries: [entry], takenBack: [], tick: null }).then(onDone, () => undefined);
      }}
    >
      <Choice
        legend="Front"
        value={pieceId}
        options={pieces.map((one) => ({ value: one.pieceId, label: one.label }))}
        onChange={setPieceId}
      />
      <Choice legend="Of its wood is still good" value={good} options={goods} onChange={setGood} />
      {usable && <TrueLength label="Good length" planned={piece.rect.width} value={usable.length} onChange={setLength} />}
      <EffectLines effect={asCut.effectWith([entry], [], null)} />
      {asCut.error && (
        <p role="alert" className="text-crayon">
          {messageOf(asCut.error)}
        </p>
      )}
      <button type="submit" className={`${buttonClass("danger")} min-h-14! text-lg!`} disabled={asCut.pending}>
        {asCut.pending ? "Saving…" : `Front ${piece.label} is spoiled`}
      </button>
    </form>
  );
}
