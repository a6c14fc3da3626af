"use client";
import { zodResolver } from "@hookform/resolvers/zod";
import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import type { z } from "zod";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { messageOf } from "@/lib/client/fault-from-server";
import { signIn } from "@/lib/client/session";
import { signInSchema } from "@/lib/schemas/session";

export function SignInForm({ next }: { next: string }) {
  const router = useRouter();
  const form = useForm<z.input<typeof signInSchema>>({
    resolver: zodResolver(signInSchema),
    defaultValues: { email: "", password: "" },
  });
  const enter = useMutation({
    mutationFn: signIn,
    onSuccess: () => {
      router.replace(next);
      router.refresh();
    },
  });
  const { errors } = form.formState;
  return (
    <form noValidate className="flex flex-col gap-4" onSubmit={form.handleSubmit((values) => enter.mutate(values))}>
      <TextField label="E-mail" type="email" autoComplete="username" error={errors.email?.message} {...form.register("email")} />
      <TextField
        label="Password"
        type="password"
        autoComplete="current-password"
        error={errors.password?.message}
        {...form.register("password")}
      />
      {enter.isError && <Notice kind="stop">{messageOf(enter.error)}</Notice>}
      <Button type="submit" kind="primary" disabled={enter.isPending || enter.isSuccess}>
        Sign in
      </Button>
    </form>
  );
}
