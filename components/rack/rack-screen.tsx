"use client";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useCallback, useOptimistic, useState, useTransition } from "react";
import type { z } from "zod";
import { blankAddress } from "@/components/board/board-address";
import { Button, buttonClass } from "@/components/ui/button";
import { Empty } from "@/components/ui/empty";
import { PageTitle } from "@/components/ui/page-title";
import { Pager } from "@/components/ui/pager";
import type { boardPageSchema } from "@/lib/schemas/board";
import { FilterButton, RackFilters } from "./rack-filters";
import { changedState, clearedState, filterCount, isUnfiltered, type RackState, rackAddress } from "./rack-query";
import { RackSearch, useSearchText } from "./rack-search";
import { RackTable } from "./rack-table";
import { RackToScale } from "./rack-to-scale";

interface Props {
  page: z.output<typeof boardPageSchema>;
  state: RackState;
  mayEdit: boolean;
}

/** All boards of the shop. What is shown follows from the address alone, so every view can be kept as a link. */
export function RackScreen({ page, state: arrived, mayEdit }: Props) {
  const router = useRouter();
  const [pending, startTransition] = useTransition();
  // What was asked for last; a second change before the first has arrived builds on it instead of undoing it.
  const [state, setState] = useOptimistic(arrived);
  const [text, setText] = useSearchText(state.search);
  const [filtering, setFiltering] = useState(filterCount(state) > 0);
  const change = useCallback(
    (part: Partial<RackState>) =>
      startTransition(() => {
        // What is being typed goes along with any other change.
        const wanted = changedState(state, { search: text.trim(), ...part });
        setState(wanted);
        router.replace(rackAddress(wanted), { scroll: "page" in part });
      }),
    [router, state, text, setState],
  );
  const takeIn = (
    <Link href="/rack/take-in" className={buttonClass("primary")}>
      {mayEdit ? "Take in wood" : "Add photographs"}
    </Link>
  );
  if (page.total === 0 && isUnfiltered(arrived)) {
    return (
      <>
        <PageTitle title="Rack" />
        <Empty title="The rack is empty" action={takeIn}>
          This is all wood of the shop, drawn to one scale from your photographs. Take in the first board: photograph it, mark its
          corners, and it hangs here.
        </Empty>
      </>
    );
  }
  return (
    <>
      <PageTitle title="Rack">
        <ViewSwitch state={state} onChange={change} />
        <RackSearch state={state} text={text} onText={setText} onChange={change} />
        <FilterButton state={state} open={filtering} onToggle={() => setFiltering(!filtering)} />
        {mayEdit && (
          <Link href={blankAddress()} className={buttonClass()}>
            Glue up a blank
          </Link>
        )}
        {takeIn}
      </PageTitle>
      {filtering && <RackFilters state={state} species={page.species} onChange={change} />}
      <div aria-busy={pending} className={pending ? "opacity-60" : ""}>
        <p className="px-4 py-2 text-sm text-pencil md:px-5" role="status">
          {page.total === 1 ? "1 board" : `${page.total} boards`}
        </p>
        {page.total === 0 && (
          <div className="flex flex-col items-start gap-3 px-4 py-6 md:px-5">
            <p>No board fits this.</p>
            <Button onClick={() => change(clearedState(state))}>Show all boards</Button>
          </div>
        )}
        {page.total > 0 && arrived.view === "scale" && <RackToScale boards={page.items} longest={page.longest} />}
        {page.total > 0 && arrived.view === "table" && <RackTable boards={page.items} state={arrived} onChange={change} />}
      </div>
      <div className="px-4 md:px-5">
        <Pager {...page} onPage={(number) => change({ page: number })} />
      </div>
    </>
  );
}

function ViewSwitch({ state, onChange }: { state: RackState; onChange: (change: Partial<RackState>) => void }) {
  const views = [
    { view: "scale", name: "To scale" },
    { view: "table", name: "As a table" },
  ] as const;
  return (
    <fieldset className="flex">
      <legend className="sr-only">View</legend>
      {views.map(({ view, name }) => (
        <button
          key={view}
          type="button"
          aria-pressed={state.view === view}
          className={`min-h-11 rounded-md px-3 md:min-h-10 ${state.view === view ? "bg-chalk-wash font-semibold text-chalk" : "text-graphite hover:bg-chalk-wash"}`}
          onClick={() => onChange({ view })}
        >
          {name}
        </button>
      ))}
    </fieldset>
  );
}
