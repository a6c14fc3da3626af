import type { Metadata } from "next";
import { cache } from "react";
import { BoardScreen } from "@/components/board/board-screen";
import { pageAccess } from "@/lib/server/access";
import { readSpecies } from "@/lib/server/boards/list-boards";
import { readBoard } from "@/lib/server/boards/read-board";
import { readHistory } from "@/lib/server/history";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readStraightenings } from "@/lib/server/straightenings/straightenings";

interface Props {
  params: Promise<{ boardId: string }>;
}

const boardFor = cache(async (boardId: string) => {
  const access = await pageAccess(`/rack/${boardId}`);
  return { access, board: await orNotFound(readBoard(access, boardId)) };
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { board } = await boardFor((await params).boardId);
  return { title: `${board.tag}, ${board.species}` };
}

export default async function BoardPage({ params }: Props) {
  const { boardId } = await params;
  const { access, board } = await boardFor(boardId);
  const [versions, story, species] = await Promise.all([
    readStraightenings(access, boardId),
    readHistory(access.shopId, { noun: "board", nounId: boardId, limit: 50 }),
    readSpecies(access),
  ]);
  return <BoardScreen board={board} versions={versions} story={story} species={species} mayEdit={access.role !== "assistant"} />;
}
