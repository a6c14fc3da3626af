"use client";
/** Making a board, from a photograph whose corners are marked next, or without one: what is known of it. */
import { useMutation } from "@tanstack/react-query";
import Image from "next/image";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { type FormEvent, useState } from "react";
import { useUnits } from "@/components/shell/units";
import { Button, buttonClass } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { Notice } from "@/components/ui/notice";
import { PageTitle } from "@/components/ui/page-title";
import { focusUnreadField, useFocusFirstError } from "@/components/ui/use-focus-first-error";
import { createBoard } from "@/lib/client/board";
import { messageOf } from "@/lib/client/fault-from-server";
import type { Um } from "@/lib/layout";
import type { Photo } from "@/lib/schemas/photo";
import { type BoardDraft, checkDraft, type DraftErrors, emptyDraft } from "./board-draft";
import { BoardFields } from "./board-fields";
import { readPercent } from "./read-percent";
import { todayIn } from "./today";

interface Size {
  readonly from: "known" | "sheet";
  readonly length: Um | null;
  readonly width: Um | null;
}

export function NewBoardScreen({ photo, species }: { photo: Photo | null; species: readonly string[] }) {
  const router = useRouter();
  const { currency, timeZone } = useUnits();
  const [draft, setDraft] = useState<BoardDraft>(emptyDraft);
  const [size, setSize] = useState<Size>({ from: "known", length: null, width: null });
  const [percent, setPercent] = useState("");
  const [takenOn, setTakenOn] = useState(() => todayIn(timeZone));
  const [errors, setErrors] = useState<DraftErrors & { length?: string; width?: string; percent?: string }>({});
  const form = useFocusFirstError(errors);
  const create = useMutation({
    mutationFn: createBoard,
    // In place of the form: going back must not offer to enter the same board once more.
    onSuccess: ({ id }) => router.replace(photo ? `/rack/${id}/mark?photo=${photo.id}` : `/rack/${id}`),
  });

  const submit = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (focusUnreadField(event.currentTarget)) return;
    const checked = checkDraft(draft, currency);
    const moisture = readPercent(percent);
    const found = {
      ...(checked.ok ? {} : checked.errors),
      ...(size.from === "known" && size.length === null && { length: "Measure how long it is" }),
      ...(size.from === "known" && size.width === null && { width: "Measure how wide it is" }),
      ...(moisture === undefined && { percent: "Write a percentage such as 8.5" }),
    };
    setErrors(found);
    if (!checked.ok || moisture === undefined || Object.keys(found).length > 0) return;
    const { length, width } = size.from === "known" ? size : { length: null, width: null };
    create.mutate({ ...checked.fields, length, width, reading: moisture === null ? null : { percent: moisture, takenOn } });
  };

  return (
    <>
      <PageTitle
        title={photo ? "A board from this photograph" : "A board without a photograph"}
        above={
          <Link href="/rack/take-in" className="underline">
            Take in wood
          </Link>
        }
      />
      <div className="grid gap-6 p-4 md:p-5 lg:grid-cols-2">
        {photo ? (
          <WholePhoto photo={photo} />
        ) : (
          <p className="text-pencil">It hangs in the rack by its size and can be laid out once a photograph of it is marked.</p>
        )}
        <form ref={form} noValidate onSubmit={submit} className="grid content-start gap-4 sm:grid-cols-2">
          <SizeFields size={size} errors={errors} bySheet={photo !== null} onChange={setSize} />
          <BoardFields draft={draft} errors={errors} species={species} onChange={setDraft} />
          <TextField
            label="Moisture, %"
            hint="As the meter shows it; leave empty if not read"
            inputMode="decimal"
            className="measure"
            error={errors.percent}
            value={percent}
            onChange={(event) => setPercent(event.target.value)}
          />
          <TextField label="Read on" type="date" value={takenOn} onChange={(event) => setTakenOn(event.target.value)} />
          <div className="flex flex-col gap-3 sm:col-span-2">
            {create.isError && <Notice kind="stop">{messageOf(create.error)}</Notice>}
            <div className="flex flex-wrap gap-2">
              <Button type="submit" kind="primary" disabled={create.isPending || create.isSuccess}>
                {photo ? "Enter board and mark it" : "Enter board"}
              </Button>
              <Link href="/rack/take-in" className={buttonClass("plain")}>
                Back
              </Link>
            </div>
          </div>
        </form>
      </div>
    </>
  );
}

function WholePhoto({ photo }: { photo: Photo }) {
  const level = photo.levels.findLast(({ widthPx, heightPx }) => Math.max(widthPx, heightPx) >= 1000) ?? photo.levels[0];
  return (
    <figure className="lg:sticky lg:top-5 lg:self-start">
      {level && (
        <Image
          unoptimized
          priority
          src={level.url}
          alt={`Photograph ${photo.fileName}`}
          width={level.widthPx}
          height={level.heightPx}
          className="max-h-[70dvh] w-full rounded-md bg-graphite object-contain"
        />
      )}
      <figcaption className="mt-1 text-sm text-pencil">{photo.fileName}</figcaption>
    </figure>
  );
}

interface SizeFieldsProps {
  size: Size;
  errors: { length?: string; width?: string };
  /** Whether a sheet in the photograph may give the size. */
  bySheet: boolean;
  onChange: (size: Size) => void;
}

function SizeFields({ size, errors, bySheet, onChange }: SizeFieldsProps) {
  const choices = [
    { from: "known", text: "I have measured the board" },
    { from: "sheet", text: "A sheet of known size lies on it: measure the board by that" },
  ] as const;
  return (
    <fieldset className="grid grid-cols-2 items-start gap-3 rounded-md border border-rule bg-sheet p-4 sm:col-span-2">
      <legend className="px-1 font-measure text-lg font-semibold">Size</legend>
      {(bySheet ? choices : []).map(({ from, text }) => (
        <label key={from} className="col-span-2 flex min-h-8 items-center gap-2">
          <input
            type="radio"
            name="size"
            className="size-5 accent-chalk"
            checked={size.from === from}
            onChange={() => onChange({ ...size, from })}
          />
          {text}
        </label>
      ))}
      {size.from === "known" && (
        <>
          <LengthField
            label="Length, along the grain"
            value={size.length}
            error={errors.length}
            onChange={(length) => onChange({ ...size, length })}
          />
          <LengthField label="Width" value={size.width} error={errors.width} onChange={(width) => onChange({ ...size, width })} />
        </>
      )}
    </fieldset>
  );
}
