"use client";
/** Planning a blank: boards of the rack edge to edge, seen from their photographs before anything is glued. */
import { useMutation, useQueryClient } from "@tanstack/react-query";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useRef, useState } from "react";
import { toast } from "sonner";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { LengthField } from "@/components/ui/length-field";
import { Notice } from "@/components/ui/notice";
import { PageTitle } from "@/components/ui/page-title";
import { PanelSection } from "@/components/ui/panel-section";
import { useUnsavedWarning } from "@/components/ui/use-unsaved-warning";
import { planBlank } from "@/lib/client/blank";
import { boardKeys } from "@/lib/client/board";
import { messageOf } from "@/lib/client/fault-from-server";
import { type ComposedBlank, type Um, um } from "@/lib/layout";
import type { BoardRow } from "@/lib/schemas/board";
import { blankConcerns } from "@/lib/words/blank-concern";
import { blankRefusalWords } from "@/lib/words/blank-refusal";
import { type BlankDraft, changedMember, freshBlank, planOf, shiftedBoard, withBoard, withoutBoard } from "./blank-draft";
import { BlankPreview, type OnSlide } from "./blank-preview";
import { ChooseBoards } from "./choose-boards";
import { MemberCard } from "./member-card";
import { type BlankPlanned, useBlankPlan } from "./use-blank-plan";

interface Props {
  /** In the blank from the start. */
  boards: readonly BoardRow[];
  /** The shop's usual allowance. */
  jointing: Um;
}

export function BlankScreen({ boards, jointing }: Props) {
  const router = useRouter();
  const client = useQueryClient();
  const [first] = useState(() => freshBlank(boards, jointing));
  const [draft, setDraft] = useState(first);
  const [choosing, setChoosing] = useState(false);
  const planned = useBlankPlan(draft);
  const blank = planned.outcome?.ok ? planned.outcome.blank : null;
  const make = useMutation({
    mutationFn: async () => {
      const plan = planOf(draft);
      if (!plan) throw new Error("A board has no picture of the side that comes up.");
      return planBlank(plan);
    },
    onSuccess: async (made) => {
      await client.invalidateQueries({ queryKey: boardKeys.all });
      toast.success(`Blank ${made.tag} is planned`);
      router.push(`/rack/${made.id}`);
    },
  });
  useUnsavedWarning(draft !== first && !make.isSuccess);
  return (
    <>
      <PageTitle
        title="Glue up a blank"
        above={
          <Link href="/rack" className="underline">
            Rack
          </Link>
        }
      >
        <Button kind="primary" disabled={blank === null || make.isPending} onClick={() => make.mutate()}>
          Plan this blank
        </Button>
      </PageTitle>
      <div className="lg:grid lg:grid-cols-[minmax(0,1fr)_26rem]">
        <div className="flex min-w-0 flex-col gap-4 p-4 md:p-5 lg:sticky lg:top-0 lg:self-start">
          <Preview draft={draft} planned={planned} blank={blank} onDraft={setDraft} />
          {make.error && <Notice kind="stop">{messageOf(make.error)}</Notice>}
          {planned.error && <Notice kind="stop">{messageOf(planned.error)}</Notice>}
        </div>
        <div className="border-rule bg-sheet lg:border-l">
          <PanelSection title="Boards" lead="From the upper edge of the blank down. Edges are named as the boards lie here.">
            {draft.members.map((member, index) => {
              const { id } = member.board;
              return (
                <MemberCard
                  key={id}
                  member={member}
                  strip={blank?.strips[index] ?? null}
                  first={index === 0}
                  last={index === draft.members.length - 1}
                  onChange={(change) => setDraft(changedMember(draft, id, change))}
                  onShift={(by) => setDraft(shiftedBoard(draft, id, by))}
                  onRemove={() => setDraft(withoutBoard(draft, id))}
                />
              );
            })}
            <Button
              className="self-start"
              kind={draft.members.length < 2 ? "primary" : "plain"}
              onClick={() => setChoosing(true)}
            >
              Add boards…
            </Button>
          </PanelSection>
          <PanelSection title="Joints" lead="What jointing takes is gone from every edge that is glued, besides what is trimmed.">
            <LengthField
              label="Jointing takes off each glued edge"
              value={draft.jointing}
              onChange={(value) => setDraft({ ...draft, jointing: value ?? um(0) })}
            />
          </PanelSection>
          <PanelSection title="The blank">
            <TextField
              label="Place"
              hint="Where it will lie once it is glued"
              maxLength={80}
              value={draft.place}
              onChange={({ target }) => setDraft({ ...draft, place: target.value })}
            />
            <TextField
              label="Note"
              maxLength={2000}
              value={draft.note}
              onChange={({ target }) => setDraft({ ...draft, note: target.value })}
            />
          </PanelSection>
        </div>
      </div>
      <ChooseBoards
        open={choosing}
        onOpenChange={setChoosing}
        chosen={draft.members.map(({ board }) => board.id)}
        onChoose={(board) => setDraft((before) => withBoard(before, board))}
      />
    </>
  );
}

interface PreviewProps {
  draft: BlankDraft;
  planned: BlankPlanned;
  blank: ComposedBlank | null;
  onDraft: (draft: BlankDraft) => void;
}

function Preview({ draft, planned, blank, onDraft }: PreviewProps) {
  const { style, print } = useUnits();
  const onSlide = useSlide(draft, onDraft);
  const { members } = draft;
  if (members.length < 2) {
    return (
      <p className="max-w-prose text-pencil">
        A blank is boards edge-glued into one wider one. Add two boards or more: they are drawn here to scale from their
        photographs, and nothing is glued before a cut order says so.
      </p>
    );
  }
  if (planned.outcome && !planned.outcome.ok) {
    const tagOf = (boardId: string) => members.find(({ board }) => board.id === boardId)?.board.tag ?? "";
    return <Notice kind="stop">{blankRefusalWords(planned.outcome.refusal, style, tagOf)}</Notice>;
  }
  if (!blank) return <p className="text-pencil">The pictures of the boards are coming.</p>;
  const concerns = blankConcerns(
    blank,
    members.map(({ board }) => board),
    style,
  );
  return (
    <>
      <BlankPreview blank={blank} members={members} pictures={planned.pictures} onSlide={onSlide} />
      <p>
        <span className="measure text-lg">
          {print(blank.length)} × {print(blank.width)} × {print(blank.thickness)}
        </span>
        <span className="text-sm text-pencil"> Drag a board to slide it along the grain.</span>
      </p>
      {concerns.map((concern) => (
        <Notice key={concern} kind="care">
          {concern}
        </Notice>
      ))}
    </>
  );
}

/** Every move is made from the draft as it was when the board was taken hold of. */
function useSlide(draft: BlankDraft, onDraft: (draft: BlankDraft) => void): OnSlide {
  const start = useRef(draft);
  return (boardId, by) => {
    if (by === null) {
      start.current = draft;
      return;
    }
    const along = start.current.members.find(({ board }) => board.id === boardId)?.along ?? um(0);
    onDraft(changedMember(start.current, boardId, { along: um(along + by) }));
  };
}
