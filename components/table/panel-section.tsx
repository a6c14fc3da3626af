import type { ReactNode } from "react";

interface Props {
  title: string;
  /** Stands beside the title: a count, a unit. */
  beside?: ReactNode;
  open?: boolean;
  children: ReactNode;
}

/** One part of the side panel; can be folded away. */
export function PanelSection({ title, beside, open = true, children }: Props) {
  return (
    <details open={open} className="group break-inside-avoid border-b border-rule px-4 py-3">
      <summary className="flex min-h-8 list-none items-center justify-between gap-2 [&::-webkit-details-marker]:hidden">
        <h2 className="text-lg">
          <span aria-hidden="true" className="mr-1.5 inline-block text-pencil transition-transform group-open:rotate-90">
            ›
          </span>
          {title}
        </h2>
        <span className="text-sm text-pencil">{beside}</span>
      </summary>
      <div className="mt-2 flex flex-col gap-3">{children}</div>
    </details>
  );
}
