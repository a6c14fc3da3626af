/** The state of the rack page as its address holds it: every filter, the order, the page and the view can be kept as a link. */
import { z } from "zod";
import { type BoardQuery, boardQuerySchema } from "@/lib/schemas/board";

const viewSchema = z.enum(["scale", "table"]).default("scale");
export type RackView = z.output<typeof viewSchema>;
export type RackState = BoardQuery & { readonly view: RackView };

type SearchParams = Readonly<Record<string, string | string[] | undefined>>;

const startState: RackState = { ...boardQuerySchema.parse({}), view: "scale" };

/** What cannot be read falls back to its default, one value at a time: an old link still opens. */
export function readRackState(params: SearchParams): RackState {
  const given = Object.fromEntries(
    Object.entries(params).map(([name, value]) => [name, Array.isArray(value) ? value[0] : value]),
  );
  const sound = Object.fromEntries(
    Object.entries(boardQuerySchema.shape).flatMap(([name, schema]) => {
      const read = schema.safeParse(given[name]);
      return read.success ? [[name, read.data]] : [];
    }),
  );
  const view = viewSchema.safeParse(given.view);
  return { ...boardQuerySchema.parse(sound), view: view.success ? view.data : startState.view };
}

/** The address of a state; what stands at its default is left out. */
export function rackAddress(state: RackState): string {
  const query = new URLSearchParams();
  for (const [name, value] of Object.entries(state)) {
    if (value !== Object.entries(startState).find(([key]) => key === name)?.[1]) query.set(name, String(value));
  }
  return query.size > 0 ? `/rack?${query}` : "/rack";
}

/** A change of filter or order begins at the first page again; a change of page or view keeps everything else. */
export function changedState(state: RackState, change: Partial<RackState>): RackState {
  const turnsPage = "page" in change || "view" in change;
  return { ...state, ...(turnsPage ? {} : { page: 1 }), ...change };
}

/** How many filters are set, beside the search. */
export function filterCount(state: RackState): number {
  const names = ["species", "cut", "minLengthUm", "minWidthUm", "minThicknessUm", "state", "free"] as const;
  return names.filter((name) => state[name] !== startState[name]).length;
}

export const isUnfiltered = (state: RackState): boolean => state.search === "" && filterCount(state) === 0;

/** Everything but order and view back to the start. */
export const clearedState = ({ sort, direction, view, pageSize }: RackState): RackState => ({
  ...startState,
  sort,
  direction,
  view,
  pageSize,
});
