"use client";
import { useState } from "react";
import { orderLabelsUrl } from "@/lib/client/order";
import { Button, buttonClass } from "../ui/button";
import { SelectField, TextField } from "../ui/field";

const sheets = {
  "a4-24": { name: "A4, 24 labels of 70 × 37 mm", labels: 24 },
  "letter-30": { name: "Letter, 30 labels of 2 5⁄8 × 1 in", labels: 30 },
} as const;
type SheetName = keyof typeof sheets;

interface Props {
  orderId: string;
  revision: number;
  paper: "a4" | "letter";
}

/** Labels for every strip, front and offcut, from the first free place of a sheet. */
export function LabelForm({ orderId, revision, paper }: Props) {
  const [sheet, setSheet] = useState<SheetName>(paper === "a4" ? "a4-24" : "letter-30");
  const [start, setStart] = useState("1");
  const most = sheets[sheet].labels;
  const position = /^\d+$/.test(start.trim()) ? Number(start) : 0;
  const sound = position >= 1 && position <= most;
  return (
    <section className="flex flex-col gap-3">
      <h2 className="text-lg">Labels</h2>
      <SelectField
        label="Sheet"
        value={sheet}
        onChange={(event) => setSheet(event.target.value === "a4-24" ? "a4-24" : "letter-30")}
      >
        {Object.entries(sheets).map(([name, { name: title }]) => (
          <option key={name} value={name}>
            {title}
          </option>
        ))}
      </SelectField>
      <TextField
        label="First free label"
        hint={`1 to ${most}, row by row from the upper left.`}
        error={sound ? undefined : `Enter a number from 1 to ${most}`}
        inputMode="numeric"
        value={start}
        onChange={(event) => setStart(event.target.value)}
      />
      {sound ? (
        <a href={orderLabelsUrl(orderId, { revision, sheet, start: position })} className={buttonClass("plain")}>
          Print labels
        </a>
      ) : (
        <Button disabled>Print labels</Button>
      )}
      <p className="text-sm text-pencil">Print at 100 %, without “fit to page”.</p>
    </section>
  );
}
