import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { rackAddress, readRackState } from "@/components/rack/rack-query";
import { RackScreen } from "@/components/rack/rack-screen";
import { pageAccess } from "@/lib/server/access";
import { readBoardPage } from "@/lib/server/boards/list-boards";

export const metadata: Metadata = { title: "Rack" };

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function RackPage({ searchParams }: Props) {
  const state = readRackState(await searchParams);
  const access = await pageAccess(rackAddress(state));
  const page = await readBoardPage(access, state);
  // A link to a page that has emptied since.
  const last = Math.max(1, Math.ceil(page.total / page.pageSize));
  if (state.page > last) redirect(rackAddress({ ...state, page: last }));
  return <RackScreen page={page} state={state} mayEdit={access.role !== "assistant"} />;
}
