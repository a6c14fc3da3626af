import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { SignInForm } from "@/components/session/sign-in-form";
import { Mark } from "@/components/shell/mark";
import { currentAccess } from "@/lib/server/access";

export const metadata: Metadata = { title: "Sign in" };

/** Only paths of our own: anything else could lead a person away. */
const ownPath = (next: string | undefined) => (next?.startsWith("/") && !/^\/[/\\]/.test(next) ? next : "/today");

export default async function SignInPage({ searchParams }: { searchParams: Promise<{ next?: string }> }) {
  const next = ownPath((await searchParams).next);
  if (await currentAccess()) redirect(next);
  return (
    <main className="mx-auto flex min-h-dvh max-w-sm flex-col justify-center gap-6 px-4 py-10">
      <div className="flex items-center gap-3">
        <Mark className="size-9" />
        <h1 className="text-2xl">Sign in to Grainwright</h1>
      </div>
      <SignInForm next={next} />
    </main>
  );
}
