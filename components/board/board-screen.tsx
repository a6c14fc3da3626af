"use client";
/** One board: its pictures under the tape, what is written about it, how it came here and what holds it. */
import Link from "next/link";
import { type ReactNode, useState } from "react";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { PageTitle } from "@/components/ui/page-title";
import type { Board } from "@/lib/schemas/board";
import type { HistoryRow } from "@/lib/schemas/history";
import type { Straightening } from "@/lib/schemas/straightening";
import { BlankBoards } from "./blank-boards";
import { BackActions, BoardActions } from "./board-actions";
import { BoardBadges, hasBadges } from "./board-facts";
import { BoardPicture } from "./board-picture";
import { BoardStory } from "./board-story";
import { BoardStrip } from "./board-strip";
import { ChangeBoardForm } from "./change-board-form";
import { FactList } from "./fact-list";
import { Readings } from "./readings";
import { VersionProgress } from "./version-progress";
import { Versions } from "./versions";

interface Props {
  board: Board;
  /** Newest first. */
  versions: readonly Straightening[];
  story: readonly HistoryRow[];
  species: readonly string[];
  mayEdit: boolean;
}

export function BoardScreen({ board, versions, story, species, mayEdit }: Props) {
  const [editing, setEditing] = useState(false);
  const face = versions.find(({ id }) => id === board.straighteningId);
  const back = versions.find(({ id }) => id === board.backStraighteningId) ?? null;
  const newest = versions[0];
  return (
    <>
      <PageTitle
        title={`${board.tag}, ${board.species}`}
        above={
          <Link href="/rack" className="underline">
            Rack
          </Link>
        }
      >
        {mayEdit && <BoardActions board={board} versions={versions} />}
      </PageTitle>
      <div className="flex flex-col gap-6 p-4 md:p-5">
        {hasBadges(board) && (
          <p className="flex flex-wrap gap-2">
            <BoardBadges board={board} />
          </p>
        )}
        {board.inBlank && <InBlank tag={board.tag} into={board.inBlank} />}
        {newest && newest.id !== face?.id && newest.id !== back?.id && <VersionProgress version={newest} mayEdit={mayEdit} />}
        {face ? (
          <BoardPicture board={board} face={face} back={back}>
            {mayEdit && <BackActions board={board} versions={versions} />}
          </BoardPicture>
        ) : (
          <NoPicture board={board} mayEdit={mayEdit} />
        )}
        <div className="grid gap-x-10 gap-y-8 lg:grid-cols-2">
          <Section
            title="Facts"
            action={
              mayEdit &&
              !editing && (
                <Button size="small" onClick={() => setEditing(true)}>
                  Change
                </Button>
              )
            }
          >
            {editing ? (
              <ChangeBoardForm key={board.revision} board={board} species={species} onDone={() => setEditing(false)} />
            ) : (
              <FactList board={board} />
            )}
          </Section>
          {board.blank && (
            <Section title="Glued up from">
              <BlankBoards board={board} blank={board.blank} mayEdit={mayEdit} />
            </Section>
          )}
          <Section title="Moisture">
            <Readings board={board} />
          </Section>
          <Section title="Held for">
            <Holds board={board} />
          </Section>
          <Section title="Versions of the pictures">
            <Versions versions={versions} faceId={board.straighteningId} backId={board.backStraighteningId} />
          </Section>
          <Section title="History">
            <BoardStory rows={story} />
          </Section>
        </div>
      </div>
    </>
  );
}

function Section({ title, action, children }: { title: string; action?: ReactNode; children: ReactNode }) {
  return (
    <section className="min-w-0">
      <div className="mb-2 flex min-h-9 items-center justify-between gap-4">
        <h2 className="text-xl">{title}</h2>
        {action}
      </div>
      {children}
    </section>
  );
}

function InBlank({ tag, into }: { tag: string; into: NonNullable<Board["inBlank"]> }) {
  return (
    <Notice>
      {tag} is to be glued into blank{" "}
      <Link href={`/rack/${into.boardId}`} className="measure text-base text-chalk underline">
        {into.tag}
      </Link>
      : it cannot be laid out by itself. Take the blank apart to have it back.
    </Notice>
  );
}

function NoPicture({ board, mayEdit }: { board: Board; mayEdit: boolean }) {
  return (
    <div className="flex flex-col gap-2">
      <div className="max-w-xl">
        <BoardStrip board={board} />
      </div>
      <p className="text-pencil">
        No picture yet.{" "}
        {board.blank
          ? "It is composed of the pictures of its boards."
          : mayEdit
            ? "Mark a photograph of it: then it can be laid out."
            : "A maker marks a photograph of it first."}
      </p>
    </div>
  );
}

function Holds({ board }: { board: Board }) {
  if (board.held.length === 0) return <p className="text-pencil">Nothing. The whole board is free.</p>;
  return (
    <ul className="divide-y divide-rule">
      {board.held.map(({ faceId, faceTitle, jobId, jobTitle }) => (
        <li key={faceId} className="py-1.5">
          <Link href={`/jobs/${jobId}/faces/${faceId}`} className="text-chalk underline-offset-4 hover:underline">
            {jobTitle}: {faceTitle}
          </Link>
        </li>
      ))}
    </ul>
  );
}
