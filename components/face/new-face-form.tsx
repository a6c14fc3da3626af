"use client";
import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { type FormEvent, useState } from "react";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { Choice } from "@/components/ui/choice";
import { SelectField, TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { messageOf } from "@/lib/client/fault-from-server";
import { createFace } from "@/lib/client/job";
import type { GridFace } from "@/lib/layout";
import type { Job } from "@/lib/schemas/job";
import type { Saw } from "@/lib/schemas/shop";
import { type AxisDraft, axisSizes, startingDraft } from "./axis-draft";
import { AxisForm } from "./axis-form";
import { cutOutFace, startingCutOut } from "./cut-out-draft";
import { CutOutFields } from "./cut-out-fields";
import { type DraftedFace, type FaceKind, faceKinds } from "./face-draft";
import { FaceDrawing } from "./face-drawing";
import { lossOfSaw } from "./loss-of-saw";
import { resawnFace, startingResawn } from "./resawn-draft";
import { ResawnFields } from "./resawn-fields";
import { startingWrap, wrapFace } from "./wrap-draft";
import { WrapFields } from "./wrap-fields";

/** Describes a face: how its pieces go together, their sizes, which way the grain runs, and the saws that part them. */
export function NewFaceForm({ job, saws }: { job: Job; saws: readonly Saw[] }) {
  const router = useRouter();
  const { units } = useUnits();
  const [title, setTitle] = useState("");
  const [grain, setGrain] = useState<GridFace["grain"]>("horizontal");
  const [columns, setColumns] = useState<AxisDraft>(() => startingDraft("columns", units));
  const [rows, setRows] = useState<AxisDraft>(() => startingDraft("rows", units));
  const [kind, setKind] = useState<FaceKind>("grid");
  const [cutOut, setCutOut] = useState(() => startingCutOut(units));
  const [wrap, setWrap] = useState(() => startingWrap(units));
  const [resawn, setResawn] = useState(() => startingResawn(units));
  const [crosscutSawId, setCrosscutSawId] = useState(() => usualSaw(saws));
  const [ripSawId, setRipSawId] = useState(() => usualSaw(saws));
  const create = useMutation({
    mutationFn: (body: Parameters<typeof createFace>[1]) => createFace(job.id, body),
    // In place of the form: going back from the layout table leads to the job.
    onSuccess: (face) => router.replace(`/jobs/${job.id}/faces/${face.id}`),
  });

  const drafted: Readonly<Record<FaceKind, () => DraftedFace>> = {
    grid: () => gridOf(columns, rows, grain),
    cutOut: () => cutOutFace(cutOut, grain),
    wrap: () => wrapFace(wrap, grain),
    resawn: () => resawnFace(resawn, grain),
  };
  const result = drafted[kind]();
  const submit = (event: FormEvent) => {
    event.preventDefault();
    if (!result.ok) return;
    create.mutate({
      title,
      face: result.face,
      crosscut: lossOfSaw(saws.find(({ id }) => id === crosscutSawId)),
      rip: lossOfSaw(saws.find(({ id }) => id === ripSawId)),
      crosscutSawId: crosscutSawId || null,
      ripSawId: ripSawId || null,
      spacing: "followGap",
    });
  };

  return (
    <form onSubmit={submit} className="grid gap-5 p-4 md:p-5 lg:grid-cols-[minmax(0,30rem)_1fr]">
      <div className="flex flex-col gap-4">
        <TextField
          label="Title"
          required
          maxLength={120}
          hint="Such as Top row, four fronts"
          value={title}
          onChange={(event) => setTitle(event.target.value)}
        />
        <Choice legend="How the pieces go together" value={kind} options={faceKinds} onChange={setKind} />
        <p className="-mt-2 text-sm text-pencil">{faceKinds.find(({ value }) => value === kind)?.hint}</p>
        {kind === "grid" && (
          <>
            <AxisForm axis="columns" draft={columns} onChange={setColumns} />
            <AxisForm axis="rows" draft={rows} onChange={setRows} />
          </>
        )}
        {kind === "cutOut" && <CutOutFields draft={cutOut} onChange={setCutOut} />}
        {kind === "resawn" && <ResawnFields draft={resawn} onChange={setResawn} />}
        {kind === "wrap" && <WrapFields draft={wrap} onChange={setWrap} />}
        <SelectField
          label="Grain runs"
          value={grain}
          onChange={(event) => setGrain(event.target.value === "vertical" ? "vertical" : "horizontal")}
        >
          <option value="horizontal">Across the face</option>
          <option value="vertical">Up and down</option>
        </SelectField>
        <SawSelect label="Crosscuts made with" saws={saws} value={crosscutSawId} onChange={setCrosscutSawId} />
        <SawSelect label="Rips made with" saws={saws} value={ripSawId} onChange={setRipSawId} />
        {create.isError && <Notice kind="stop">{messageOf(create.error)}</Notice>}
        <Button type="submit" kind="primary" disabled={!result.ok || create.isPending || create.isSuccess}>
          Add face
        </Button>
      </div>
      <div className="lg:sticky lg:top-5 lg:self-start">
        <h2 className="mb-2 text-lg">As it will stand</h2>
        {result.ok ? (
          <FaceDrawing face={result.face} className="aspect-5/2 max-h-[60dvh] w-full" />
        ) : (
          <p className="text-pencil">{result.message}</p>
        )}
      </div>
    </form>
  );
}

/** Most fronts are parted at the table saw; a shop without one begins with the first of its saws. */
const usualSaw = (saws: readonly Saw[]): string => (saws.find(({ kind }) => kind === "table") ?? saws[0])?.id ?? "";

function SawSelect({
  label,
  saws,
  value,
  onChange,
}: {
  label: string;
  saws: readonly Saw[];
  value: string;
  onChange: (sawId: string) => void;
}) {
  const { print } = useUnits();
  return (
    <SelectField label={label} value={value} onChange={(event) => onChange(event.target.value)} required>
      {saws.map((saw) => (
        <option key={saw.id} value={saw.id}>
          {saw.name}, kerf {print(saw.kerf)}
        </option>
      ))}
    </SelectField>
  );
}

function gridOf(columns: AxisDraft, rows: AxisDraft, grain: GridFace["grain"]): DraftedFace {
  const across = axisSizes(columns);
  const down = axisSizes(rows);
  if (!across.ok || !down.ok) return { ok: false, message: "Nothing to draw until the sizes fit." };
  return {
    ok: true,
    face: { pattern: "grid", columns: across.sizes, rows: down.sizes, columnGaps: across.gaps, rowGaps: down.gaps, grain },
  };
}
