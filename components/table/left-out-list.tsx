"use client";
/** Why boards were left out of a search, for those who ask. */
import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { messageOf } from "@/lib/client/fault-from-server";
import { leftOutQuery } from "@/lib/client/wood-search";
import { leftOutWords } from "@/lib/words/wood-search";

export function LeftOutList({ searchId }: { searchId: string }) {
  const { style } = useUnits();
  const [open, setOpen] = useState(false);
  const [page, setPage] = useState(1);
  const query = useQuery({ ...leftOutQuery(searchId, page), enabled: open });
  const pages = query.data ? Math.ceil(query.data.total / query.data.pageSize) : 1;
  return (
    <details open={open} onToggle={(event) => setOpen(event.currentTarget.open)} className="border-t border-rule pt-3">
      <summary className="min-h-8 cursor-pointer text-chalk">Why boards were left out</summary>
      {query.isError && <p className="text-sm text-crayon">{messageOf(query.error)}</p>}
      <ul className="mt-2 flex flex-col gap-1 text-sm">
        {query.data?.items.map(({ boardId, tag, species, reasons }) => (
          <li key={boardId}>
            <span className="measure">{tag}</span> {species}: {reasons.map((reason) => leftOutWords(reason, style)).join("; ")}
          </li>
        ))}
      </ul>
      {pages > 1 && (
        <div className="mt-2 flex items-center gap-2">
          <Button size="small" disabled={page === 1} onClick={() => setPage(page - 1)}>
            Back
          </Button>
          <span className="text-sm">
            Page {page} of {pages}
          </span>
          <Button size="small" disabled={page === pages} onClick={() => setPage(page + 1)}>
            On
          </Button>
        </div>
      )}
    </details>
  );
}
