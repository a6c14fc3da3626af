"use client";
import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { type FormEvent, useState } from "react";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { addMoistureReading } from "@/lib/client/board";
import { messageOf } from "@/lib/client/fault-from-server";
import type { Board } from "@/lib/schemas/board";
import { dayText } from "@/lib/words/day";
import { readPercent } from "./read-percent";
import { todayIn } from "./today";

/** Moisture as read over time, the latest first, and a place for the next reading. */
export function Readings({ board }: { board: Board }) {
  return (
    <>
      {board.readings.length > 0 && (
        <table className="mb-4 w-full text-sm">
          <thead className="sr-only">
            <tr>
              <th scope="col">Moisture</th>
              <th scope="col">Read on</th>
              <th scope="col">By</th>
            </tr>
          </thead>
          <tbody>
            {board.readings.map(({ id, percent, takenOn, takenBy }) => (
              <tr key={id} className="border-b border-rule">
                <td className="measure py-1.5 pr-4 text-base">{percent.toFixed(1)} %</td>
                <td className="measure pr-4">{dayText(takenOn)}</td>
                <td className="text-pencil">{takenBy}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <NewReading boardId={board.id} />
    </>
  );
}

function NewReading({ boardId }: { boardId: string }) {
  const router = useRouter();
  const { timeZone } = useUnits();
  const [text, setText] = useState("");
  const [takenOn, setTakenOn] = useState(() => todayIn(timeZone));
  const [wrong, setWrong] = useState(false);
  const add = useMutation({
    mutationFn: (percent: number) => addMoistureReading(boardId, { percent, takenOn }),
    onSuccess: () => {
      setText("");
      router.refresh();
    },
  });
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const percent = readPercent(text);
    setWrong(typeof percent !== "number");
    if (typeof percent === "number") add.mutate(percent);
  };
  return (
    <form noValidate onSubmit={submit} className="flex flex-wrap items-start gap-3">
      <div className="w-28">
        <TextField
          label="Moisture, %"
          inputMode="decimal"
          className="measure"
          error={wrong ? "Such as 8.5" : undefined}
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
      </div>
      <div className="w-40">
        <TextField label="Read on" type="date" value={takenOn} onChange={(event) => setTakenOn(event.target.value)} />
      </div>
      <Button type="submit" className="self-end" disabled={add.isPending}>
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
