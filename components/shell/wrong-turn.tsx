import Link from "next/link";
import type { ReactNode } from "react";
import { buttonClass } from "../ui/button";
import { Mark } from "./mark";

/** A page that says what is wrong and leads back. */
export function WrongTurn({ title, children, action }: { title: string; children: ReactNode; action?: ReactNode }) {
  return (
    <main className="mx-auto flex min-h-[70dvh] max-w-md flex-col items-start justify-center gap-4 px-4 py-16">
      <Mark className="size-9" />
      <h1 className="text-2xl">{title}</h1>
      <p>{children}</p>
      <div className="flex gap-2">
        {action}
        <Link href="/today" className={buttonClass(action ? "plain" : "primary")}>
          Go to Today
        </Link>
      </div>
    </main>
  );
}
