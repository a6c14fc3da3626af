"use client";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { DropdownMenu } from "radix-ui";
import { toast } from "sonner";
import { messageOf } from "@/lib/client/fault-from-server";
import { signOut, signOutEverywhere } from "@/lib/client/session";
import type { Session } from "@/lib/schemas/session";

const initials = (name: string) =>
  name
    .split(/\s+/)
    .map((word) => word[0] ?? "")
    .join("")
    .slice(0, 2)
    .toUpperCase();

const itemClass = "flex min-h-11 items-center rounded-sm px-3 outline-none data-highlighted:bg-chalk-wash";

export function AccountMenu({ session }: { session: Session }) {
  const router = useRouter();
  const client = useQueryClient();
  const leave = useMutation({
    mutationFn: async (everywhere: boolean) => {
      if (everywhere) await signOutEverywhere();
      else await signOut();
    },
    onSuccess: () => {
      client.clear();
      router.replace("/sign-in");
      router.refresh();
    },
    onError: (error) => toast.error(messageOf(error)),
  });
  return (
    <DropdownMenu.Root>
      <DropdownMenu.Trigger
        className="flex h-12 items-center gap-3 focus-visible:outline-tape"
        aria-label={`Account of ${session.user.name}`}
      >
        <span className="hidden text-[#d5dadb] lg:inline">{session.shop.name}</span>
        <span className="grid size-9 place-items-center rounded-full bg-[#3a4348] text-sm font-semibold" aria-hidden="true">
          {initials(session.user.name)}
        </span>
      </DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align="end"
          className="z-50 min-w-60 rounded-md border border-line bg-sheet p-1 text-graphite shadow-lg"
        >
          <DropdownMenu.Label className="px-3 py-2 text-sm">
            <span className="block font-semibold">{session.user.name}</span>
            <span className="block text-pencil">
              {session.role} at {session.shop.name}
            </span>
          </DropdownMenu.Label>
          <DropdownMenu.Separator className="my-1 h-px bg-rule" />
          <DropdownMenu.Item className={itemClass} onSelect={() => leave.mutate(false)}>
            Sign out
          </DropdownMenu.Item>
          <DropdownMenu.Item className={itemClass} onSelect={() => leave.mutate(true)}>
            Sign out on every device
          </DropdownMenu.Item>
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}
