import type { Metadata } from "next";
import { forbidden } from "next/navigation";
import { BlankScreen } from "@/components/blank/blank-screen";
import { pageAccess } from "@/lib/server/access";
import { readBoard } from "@/lib/server/boards/read-board";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { shopSettings } from "@/lib/server/shops";

export const metadata: Metadata = { title: "Glue up a blank" };

interface Props {
  searchParams: Promise<{ with?: string | string[] }>;
}

/** With a board in the address, that board is in the blank from the start. */
export default async function GlueUpPage({ searchParams }: Props) {
  const { with: boardId } = await searchParams;
  const access = await pageAccess("/rack/glue-up");
  if (access.role === "assistant") forbidden();
  const { jointing } = await shopSettings(access.shopId);
  const given = typeof boardId === "string" ? await orNotFound(readBoard(access, boardId)) : null;
  const free = given !== null && given.straighteningId !== null && given.inBlank === null;
  return <BlankScreen boards={free ? [given] : []} jointing={jointing} />;
}
