import type { ReactNode } from "react";

/** One step of the marking. */
export function PanelSection({ title, lead, children }: { title: string; lead?: string; children: ReactNode }) {
  return (
    <section className="flex flex-col gap-3 border-b border-rule px-4 py-4 last:border-b-0">
      <div>
        <h2 className="text-lg">{title}</h2>
        {lead && <p className="text-sm text-pencil">{lead}</p>}
      </div>
      {children}
    </section>
  );
}
