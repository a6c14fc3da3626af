import type { Metadata } from "next";
import { forbidden, redirect } from "next/navigation";
import { ZonesScreen } from "@/components/zones/zones-screen";
import { pageAccess } from "@/lib/server/access";
import { readBoard } from "@/lib/server/boards/read-board";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readStraightening } from "@/lib/server/straightenings/straightenings";

export const metadata: Metadata = { title: "Outline and keep-clear areas" };

interface Props {
  params: Promise<{ boardId: string }>;
  searchParams: Promise<{ side?: string | string[] }>;
}

/** Of the face, unless the back is asked for. */
export default async function ZonesPage({ params, searchParams }: Props) {
  const { boardId } = await params;
  const { side } = await searchParams;
  const access = await pageAccess(`/rack/${boardId}/zones`);
  if (access.role === "assistant") forbidden();
  const { straighteningId, backStraighteningId, ...board } = await orNotFound(readBoard(access, boardId));
  const [shown, other] = side === "back" ? [backStraighteningId, straighteningId] : [straighteningId, backStraighteningId];
  // Areas are drawn on a picture; the board's page offers the way to one.
  if (shown === null) redirect(`/rack/${boardId}`);
  const straightening = await orNotFound(readStraightening(access, shown));
  const otherSide = other === null ? null : await orNotFound(readStraightening(access, other));
  return (
    <ZonesScreen
      key={straightening.id}
      board={{ ...board, straighteningId, backStraighteningId }}
      straightening={straightening}
      otherSide={otherSide}
    />
  );
}
