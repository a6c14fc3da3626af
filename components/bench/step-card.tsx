"use client";
/** What to do now: the drawing, the setting as the largest thing, what comes of it, and the cautions. */
import type { ReactNode } from "react";
import { mmFromUm, printedLength } from "@/lib/layout";
import type { GluingMember } from "@/lib/schemas/gluing";
import type { Order } from "@/lib/schemas/order";
import type { SnapshotBoard } from "@/lib/schemas/order-snapshot";
import type { OrderStep } from "@/lib/schemas/order-steps";
import { firstOfAll } from "@/lib/words/caution";
import { type StepWords, stepWords, styleOf } from "@/lib/words/order-step";
import { sizeFigures } from "@/lib/words/part-name";
import { yieldRoles } from "@/lib/words/yield-role";
import { FaceView } from "../order/face-view";
import { WhoAndWhen } from "../order/who-and-when";
import { WoodView } from "../order/wood-view";
import { Notice } from "../ui/notice";
import { CutDrawing } from "./cut-drawing";

interface Props {
  order: Order;
  step: OrderStep;
  before: OrderStep | undefined;
  tick: Order["ticks"][number] | undefined;
}

export function StepCard({ order, step, before, tick }: Props) {
  const style = styleOf(order.snapshot);
  const words = stepWords(step, style, before);
  const title = `${words.verb} ${words.rest}`;
  return (
    <>
      {tick && (
        <Notice kind="sound">
          Done: <WhoAndWhen tick={tick} />
        </Notice>
      )}
      <h1 className="text-2xl" aria-live="polite">
        {title}
      </h1>
      <Drawing order={order} step={step} title={title} />
      <Setting words={words} style={style} />
      {words.notes.map((note) => (
        <p key={note} className="text-lg">
          {note.charAt(0).toUpperCase() + note.slice(1)}
          {note.endsWith(".") ? "" : "."}
        </p>
      ))}
      <Results step={step} words={words} style={style} />
      {words.cautions.length > 0 && (
        <Notice kind="stop">
          <ul className="flex flex-col gap-1 text-base">
            {words.cautions.map((caution) => (
              <li key={caution}>{caution}</li>
            ))}
            <li className="text-sm">{firstOfAll}</li>
          </ul>
        </Notice>
      )}
    </>
  );
}

function Drawing({ order: { snapshot }, step, title }: Pick<Props, "order" | "step"> & { title: string }) {
  const { board } = step;
  if (step.kind === "cut") return <CutDrawing snapshot={snapshot} board={board} cut={step.cut} title={title} />;
  if (step.kind === "test-cut" || step.kind === "clean-up") return null;
  const shown = step.kind === "fetch-member" ? memberAsBoard(board, step.member) : board;
  const whole = { x: 0, y: 0, width: mmFromUm(shown.length), height: mmFromUm(shown.width) };
  return (
    <>
      <WoodView
        snapshot={snapshot}
        board={shown}
        window={whole}
        label={step.kind === "fetch-member" ? `Board ${shown.tag}` : `Board ${shown.tag} with its fronts`}
        className="rounded-sm"
      />
      {step.kind === "mark" &&
        snapshot.faces.map(({ faceId, title: name, layout }) => (
          <FaceView key={faceId} layout={layout} title={name} className="max-h-56" />
        ))}
    </>
  );
}

/** A board of a blank by itself, before anything is done to it. */
function memberAsBoard(blank: SnapshotBoard, member: GluingMember): SnapshotBoard {
  const { glueLines: _lines, gluing: _gluing, ...rest } = blank;
  return { ...rest, ...member, outline: null, keepClear: [], pieces: [] };
}

function Setting({ words, style }: { words: StepWords; style: ReturnType<typeof styleOf> }) {
  if (words.setting === null) return null;
  const { figure } = printedLength(words.setting, style);
  return (
    <Box label={words.measure ?? ""}>
      <p className="measure text-setting leading-none">
        {figure}
        <span className="ml-2 text-2xl text-pencil">{style.unit === "mm" ? "mm" : "in"}</span>
      </p>
    </Box>
  );
}

/** Of a cut every part with what becomes of it; of other steps what they are about. */
function Results({ step, words, style }: { step: OrderStep; words: StepWords; style: ReturnType<typeof styleOf> }) {
  if (step.kind === "fetch" || step.kind === "fetch-member") {
    const board = step.kind === "fetch" ? step.board : step.member;
    const size = `${sizeFigures({ width: board.length, height: board.width }, style)} × ${printedLength(board.thickness, style).figure}`;
    return (
      <Box label={`${board.species}, ${size}`}>
        <p className="measure text-2xl">{board.place || "No place is noted for this board"}</p>
      </Box>
    );
  }
  const results =
    step.kind === "cut"
      ? yieldRoles(step.cut).map(({ role, name, part }) => ({
          role,
          name,
          size: part.kind === "waste" ? null : sizeFigures(part.rect, style),
        }))
      : words.gives.map(({ word, label, size }) => ({ role: word || "You get", name: label ?? "", size }));
  if (results.length === 0 || (step.kind === "cut" && step.cut.kind === "true")) return null;
  return (
    <div className="grid grid-cols-2 gap-2">
      {results.map(({ role, name, size }) => (
        <Box key={`${role} ${name}`} label={role}>
          {name && <p className="measure text-xl">{name}</p>}
          {size && <p className="measure text-pencil">{size}</p>}
        </Box>
      ))}
    </div>
  );
}

function Box({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="min-w-0 rounded-md border border-rule bg-sheet px-3 py-2.5">
      <p className="text-pencil first-letter:uppercase">{label}</p>
      {children}
    </div>
  );
}
