import type { ReactNode } from "react";

/** What a page is for, and the first step. */
export function Empty({ title, children, action }: { title: string; children: ReactNode; action?: ReactNode }) {
  return (
    <div className="mx-auto flex max-w-md flex-col items-center gap-3 px-4 py-16 text-center">
      <h2 className="text-xl">{title}</h2>
      <p className="text-pencil">{children}</p>
      {action}
    </div>
  );
}
