"use client";
/** One board of the rest: what is cut and in hand, what does not fit and what is done about it, and where every front lies now. */
import { useId } from "react";
import { mmFromUm, printLength, type RescueKind } from "@/lib/layout";
import type { Order } from "@/lib/schemas/order";
import type { RestBoard } from "@/lib/schemas/rest";
import { styleOf } from "@/lib/words/order-step";
import { labelRanges, partName, sizeFigures } from "@/lib/words/part-name";
import { factSentences, rescueTitle, wayWords } from "@/lib/words/rest";
import { WoodView } from "./wood-view";

interface Props {
  order: Order;
  board: RestBoard;
  onChoose: (key: string, kind: RescueKind) => void;
}

export function RestBoardView({ order: { snapshot }, board, onChoose }: Props) {
  const style = styleOf(snapshot);
  const issued = snapshot.boards.find(({ boardId }) => boardId === board.boardId);
  const whole = issued && { x: 0, y: 0, width: mmFromUm(issued.length), height: mmFromUm(issued.width) };
  const steps = board.toCome === 1 ? "1 step to come" : `${board.toCome} steps to come`;
  return (
    <div className="flex min-w-0 flex-col gap-2">
      <h3 className="text-lg">Board {board.tag}</h3>
      {issued && whole && (
        <WoodView
          snapshot={{ ...snapshot, faces: [] }}
          board={{ ...issued, pieces: board.pieces.map((piece) => ({ ...piece, turns: 0 })) }}
          window={whole}
          label={`Board ${board.tag} with what is cut shaded and every front where it lies now`}
          className="max-h-72"
        >
          <Overlay board={board} />
        </WoodView>
      )}
      <p>
        {board.cut.length > 0
          ? `Cut: ${board.cut.length > 1 ? "fronts" : "front"} ${labelRanges(board.cut)}. `
          : "No front is cut yet. "}
        {board.inHand.length > 0 &&
          `In hand: ${board.inHand.map((part) => `${partName(part)}, ${sizeFigures(part.rect, style)}`).join("; ")}. `}
        {board.changed ? `${steps}, planned anew.` : `${steps}, as they were issued.`}
        {board.implied > 0 &&
          ` ${board.implied} ${board.implied === 1 ? "step counts" : "steps count"} as done because a later one is ticked.`}
      </p>
      {board.troubles.length === 0 && board.changed && <p>Every front stays where it lies; only settings change.</p>}
      {board.troubles.map((trouble) => (
        <TroubleChoice key={trouble.key} trouble={trouble} style={style} onChoose={(kind) => onChoose(trouble.key, kind)} />
      ))}
    </div>
  );
}

function TroubleChoice({
  trouble,
  style,
  onChoose,
}: {
  trouble: RestBoard["troubles"][number];
  style: ReturnType<typeof styleOf>;
  onChoose: (kind: RescueKind) => void;
}) {
  const name = useId();
  const chosen = trouble.rescues.find(({ kind }) => kind === trouble.chosen);
  const moved = chosen?.changes.filter(({ by }) => by.x !== 0 || by.y !== 0) ?? [];
  return (
    <fieldset className="rounded-sm border-l-4 border-tape bg-tape-wash px-3 py-2">
      <legend className="float-left w-full font-semibold">{factSentences(trouble, style).join("; ")}.</legend>
      <div className="clear-both flex flex-col">
        {trouble.rescues.map((rescue) => (
          <label key={rescue.kind} className="flex min-h-11 cursor-pointer items-center gap-2 md:min-h-9">
            <input
              type="radio"
              name={name}
              className="size-5 shrink-0 accent-chalk"
              checked={rescue.kind === trouble.chosen}
              onChange={() => onChoose(rescue.kind)}
            />
            <span>{rescueTitle(rescue, style)}</span>
          </label>
        ))}
      </div>
      {moved.length > 0 && (
        <p className="text-sm">
          Moved:{" "}
          {moved.map((change) => `front ${change.label} ${wayWords(change, (length) => printLength(length, style))}`).join("; ")}.
        </p>
      )}
    </fieldset>
  );
}

/** What is cut is shaded; parts in hand have a dashed yellow edge. */
function Overlay({ board: { cut, pieces, inHand } }: { board: RestBoard }) {
  const rect = ({ rect: { x, y, width, height } }: { rect: RestBoard["pieces"][number]["rect"] }) => ({
    x: mmFromUm(x),
    y: mmFromUm(y),
    width: mmFromUm(width),
    height: mmFromUm(height),
  });
  return (
    <g>
      {inHand.map((part) => (
        <rect
          key={part.id}
          {...rect(part)}
          fill="none"
          stroke="#f0c330"
          strokeWidth="2.5"
          strokeDasharray="8 5"
          vectorEffect="non-scaling-stroke"
        />
      ))}
      {pieces
        .filter(({ label }) => cut.includes(label))
        .map((piece) => (
          <rect key={piece.pieceId} {...rect(piece)} fill="#2f6b4a" fillOpacity="0.5" />
        ))}
    </g>
  );
}
