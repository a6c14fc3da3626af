import type { Metadata } from "next";
import { NewBoardScreen } from "@/components/board/new-board-screen";
import { TakeInScreen } from "@/components/photo/take-in-screen";
import { pageAccess } from "@/lib/server/access";
import { readSpecies } from "@/lib/server/boards/list-boards";
import { orNotFound } from "@/lib/server/http/or-not-found";
import { readLoosePhotos, readPhoto } from "@/lib/server/photos/photos";

export const metadata: Metadata = { title: "Take in wood" };

interface Props {
  searchParams: Promise<{ photo?: string | string[] }>;
}

/** With a photograph in the address: the form for the board on it; with "none", for a board that has no photograph yet. */
export default async function TakeInPage({ searchParams }: Props) {
  const { photo } = await searchParams;
  const access = await pageAccess("/rack/take-in");
  const mayEdit = access.role !== "assistant";
  if (typeof photo === "string" && mayEdit) {
    const found = photo === "none" ? null : await orNotFound(readPhoto(access, photo));
    return <NewBoardScreen photo={found} species={await readSpecies(access)} />;
  }
  return <TakeInScreen photos={await readLoosePhotos(access, 50)} mayEdit={mayEdit} />;
}
