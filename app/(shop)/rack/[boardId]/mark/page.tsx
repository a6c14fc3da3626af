import type { Metadata } from "next";
import { forbidden, redirect } from "next/navigation";
import { MarkingScreen } from "@/components/marking/marking-screen";
import { pageAccess } from "@/lib/server/access";
import { readBoard } from "@/lib/server/boards/read-board";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readPhoto } from "@/lib/server/photos/photos";
import { readStraightenings } from "@/lib/server/straightenings/straightenings";

export const metadata: Metadata = { title: "Mark a board" };

interface Props {
  params: Promise<{ boardId: string }>;
  searchParams: Promise<{ photo?: string | string[]; side?: string | string[] }>;
}

/** Marks start from the newest version made on the same photograph. */
export default async function MarkPage({ params, searchParams }: Props) {
  const { boardId } = await params;
  const { photo: photoId, side } = await searchParams;
  const access = await pageAccess(`/rack/${boardId}/mark`);
  if (access.role === "assistant") forbidden();
  if (typeof photoId !== "string") redirect(`/rack/${boardId}`);
  const board = await orNotFound(readBoard(access, boardId));
  const photo = await orNotFound(readPhoto(access, photoId));
  const previous = (await readStraightenings(access, boardId)).find((version) => version.photoId === photoId) ?? null;
  // The back is the face turned over: without a face there is nothing to turn.
  const mayBeBack = board.straighteningId !== null;
  const wanted = side === "back" || (side === undefined && previous?.side === "back") ? "back" : "face";
  return <MarkingScreen board={board} photo={photo} previous={previous} side={mayBeBack ? wanted : "face"} />;
}
