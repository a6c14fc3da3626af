import type { ReactNode } from "react";

/** The bar under the navigation: what this page is, and what can be done here. */
export function PageTitle({ title, above, children }: { title: string; above?: ReactNode; children?: ReactNode }) {
  return (
    <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 border-b border-rule bg-sheet px-4 py-3 md:px-5">
      <div className="min-w-0">
        {/* The way back is often gone by thumb: its links are taller than their words. */}
        {above && <div className="text-sm text-pencil [&_a]:inline-block [&_a]:py-0.5 pointer-coarse:[&_a]:py-2.5">{above}</div>}
        <h1 className="text-xl break-words">{title}</h1>
      </div>
      {children && <div className="flex flex-wrap items-center gap-2">{children}</div>}
    </div>
  );
}
