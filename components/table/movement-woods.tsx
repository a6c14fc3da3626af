"use client";
/** Which wood each board is: species, ring angle, and the moisture it was last read at. */
import { useMutation, useQueryClient } from "@tanstack/react-query";
import Link from "next/link";
import { type FormEvent, useState } from "react";
import { readPercent } from "@/components/board/read-percent";
import { todayIn } from "@/components/board/today";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { NumberField } from "@/components/ui/number-field";
import { addMoistureReading } from "@/lib/client/board";
import { messageOf } from "@/lib/client/fault-from-server";
import { movementKeys } from "@/lib/client/movement";
import { noWoodChoice, ringAngleOfCut, type Species } from "@/lib/layout";
import type { BoardWoodRow } from "@/lib/schemas/movement";
import { dayText } from "@/lib/words/day";
import { percentText } from "@/lib/words/movement";
import { useTableContext } from "./table-context";
import { type Movement, useChoose } from "./use-movement";

export function MovementWoods({ movement }: { movement: Movement }) {
  return movement.facts.boards.map((board) => <BoardWoodPart key={board.boardId} board={board} movement={movement} />);
}

const sawn = { flat: "flat sawn", rift: "rift", quarter: "quarter sawn" } as const;

function BoardWoodPart({ board, movement: { facts, woods } }: { board: BoardWoodRow; movement: Movement }) {
  const { editor } = useTableContext();
  const choose = useChoose();
  const known = woods.byBoard.get(board.boardId);
  const choice = facts.choices.woods[board.boardId] ?? noWoodChoice;
  const change = (part: Partial<typeof choice>) =>
    choose.mutate(({ woods: present }) => ({ woods: { ...present, [board.boardId]: { ...choice, ...part } } }));
  return (
    <div className="flex flex-col gap-2 border-t border-rule pt-2">
      <p className="text-sm">
        <Link href={`/rack/${board.boardId}`} className="measure text-base text-chalk underline-offset-2 hover:underline">
          {board.tag}
        </Link>{" "}
        {known?.species?.name ?? board.species}, {sawn[board.cut]},{" "}
        {board.reading ? (
          <>
            <span className="measure">{percentText(board.reading.percent)}</span> on {dayText(board.reading.takenOn)}
          </>
        ) : (
          "moisture not read"
        )}
      </p>
      <fieldset className="grid grid-cols-[minmax(0,1fr)_6rem] items-start gap-2" disabled={!editor.mayChange}>
        <legend className="sr-only">Wood of board {board.tag}</legend>
        <SelectField
          label={`Species of ${board.tag}`}
          hint={known?.species ? sourceText(known.species) : `“${board.species}” is not in the table.`}
          value={choice.species ?? ""}
          onChange={(event) => change({ species: event.target.value === "" ? null : event.target.value })}
        >
          <option value="">{known?.match.kind === "found" ? `As written: ${known.match.species.name}` : "Choose…"}</option>
          <SpeciesOptions likely={known?.match.kind === "choose" ? known.match.candidates : []} all={woods.species} />
        </SelectField>
        <NumberField
          label="Ring angle, °"
          hint={`Empty: ${ringAngleOfCut[board.cut]}`}
          value={choice.ringAngle}
          min={0}
          max={90}
          digits={0}
          onChange={(ringAngle) => change({ ringAngle })}
        />
      </fieldset>
      {!board.reading && <FirstReading board={board} />}
    </div>
  );
}

function SpeciesOptions({ likely, all }: { likely: readonly Species[]; all: readonly Species[] }) {
  const own = all.filter(({ source }) => source.kind === "shop");
  const published = all.filter(({ source }) => source.kind !== "shop");
  const groups = [
    { label: "Perhaps", species: likely },
    { label: "Your own", species: own },
    { label: "Table", species: published },
  ];
  return groups
    .filter(({ species }) => species.length > 0)
    .map(({ label, species }) => (
      <optgroup key={label} label={label}>
        {species.map(({ key, name }) => (
          <option key={key} value={key}>
            {name}
          </option>
        ))}
      </optgroup>
    ));
}

/** How it moves and where that is known from. */
function sourceText({ movement: { kind, radial, tangential }, source }: Species): string {
  if (source.kind === "shrinkage") return source.text;
  const figures =
    kind === "coefficients"
      ? `C radial ${radial}, tangential ${tangential}`
      : `Shrinkage ${radial} % radial, ${tangential} % tangential`;
  return `${figures}. ${source.text}`;
}

function FirstReading({ board }: { board: BoardWoodRow }) {
  const { faceId } = useTableContext();
  const { timeZone } = useUnits();
  const client = useQueryClient();
  const [text, setText] = useState("");
  const [wrong, setWrong] = useState(false);
  const add = useMutation({
    mutationFn: (percent: number) => addMoistureReading(board.boardId, { percent, takenOn: todayIn(timeZone) }),
    onSuccess: () => client.invalidateQueries({ queryKey: movementKeys.face(faceId) }),
  });
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const percent = readPercent(text);
    setWrong(typeof percent !== "number");
    if (typeof percent === "number") add.mutate(percent);
  };
  return (
    <form noValidate onSubmit={submit} className="flex flex-wrap items-start gap-2">
      <div className="w-36">
        <TextField
          label="Read today, %"
          inputMode="decimal"
          className="measure"
          autoComplete="off"
          error={wrong ? "Such as 8.5" : undefined}
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
      </div>
      <Button type="submit" className="mt-6" disabled={add.isPending}>
        Add reading
      </Button>
      {add.isError && (
        <div className="w-full">
          <Notice kind="stop">{messageOf(add.error)}</Notice>
        </div>
      )}
    </form>
  );
}
