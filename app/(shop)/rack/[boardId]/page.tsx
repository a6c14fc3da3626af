import type { Metadata } from "next";
import { BoardScreen } from "@/components/board/board-screen";
import { pageAccess } from "@/lib/server/access";
import { readSpecies } from "@/lib/server/boards/list-boards";
import { readBoard } from "@/lib/server/boards/read-board";
import { readHistory } from "@/lib/server/history";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readStraightenings } from "@/lib/server/straightenings/straightenings";

export const metadata: Metadata = { title: "Board" };

export default async function BoardPage({ params }: { params: Promise<{ boardId: string }> }) {
  const { boardId } = await params;
  const access = await pageAccess(`/rack/${boardId}`);
  const board = await orNotFound(readBoard(access, boardId));
  const [versions, story, species] = await Promise.all([
    readStraightenings(access, boardId),
    readHistory(access.shopId, { noun: "board", nounId: boardId, limit: 50 }),
    readSpecies(access),
  ]);
  return <BoardScreen board={board} versions={versions} story={story} species={species} mayEdit={access.role !== "assistant"} />;
}
