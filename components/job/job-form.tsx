"use client";
import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import type { z } from "zod";
import { Button } from "@/components/ui/button";
import { TextAreaField, TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { messageOf } from "@/lib/client/fault-from-server";
import { createJobSchema } from "@/lib/schemas/job";

export type JobFormValues = z.input<typeof createJobSchema>;

interface Props {
  values: JobFormValues;
  submit: string;
  pending: boolean;
  error: Error | null;
  onSubmit: (values: JobFormValues) => void;
}

/** What is written about a job: for opening one and for changing it. */
export function JobForm({ values, submit, pending, error, onSubmit }: Props) {
  const form = useForm<JobFormValues>({ resolver: zodResolver(createJobSchema), defaultValues: values });
  const { errors } = form.formState;
  return (
    <form noValidate className="flex flex-col gap-4" onSubmit={form.handleSubmit(onSubmit)}>
      <TextField
        label="Title"
        hint="What is being made, such as Map chest for the reading room"
        error={errors.title?.message}
        {...form.register("title")}
      />
      <TextField label="Client" error={errors.client?.message} {...form.register("client")} />
      <TextField
        label="Due"
        type="date"
        error={errors.dueOn?.message}
        {...form.register("dueOn", { setValueAs: (value: string | null) => value || null })}
      />
      <TextAreaField label="Note" error={errors.note?.message} {...form.register("note")} />
      {error && <Notice kind="stop">{messageOf(error)}</Notice>}
      <Button type="submit" kind="primary" disabled={pending}>
        {submit}
      </Button>
    </form>
  );
}
