import type { Metadata } from "next";
import { forbidden, redirect } from "next/navigation";
import { ZonesScreen } from "@/components/zones/zones-screen";
import { pageAccess } from "@/lib/server/access";
import { readBoard } from "@/lib/server/boards/read-board";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readStraightening } from "@/lib/server/straightenings/straightenings";

export const metadata: Metadata = { title: "Outline and keep-clear areas" };

export default async function ZonesPage({ params }: { params: Promise<{ boardId: string }> }) {
  const { boardId } = await params;
  const access = await pageAccess(`/rack/${boardId}/zones`);
  if (access.role === "assistant") forbidden();
  const board = await orNotFound(readBoard(access, boardId));
  // Areas are drawn on a picture; the board's page offers the way to one.
  if (board.straighteningId === null) redirect(`/rack/${boardId}`);
  const straightening = await orNotFound(readStraightening(access, board.straighteningId));
  return <ZonesScreen key={straightening.id} board={board} straightening={straightening} />;
}
