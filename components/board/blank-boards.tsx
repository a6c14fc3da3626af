"use client";
/** What a planned blank is glued up from, and the way back while nothing was issued from it. */
import { useMutation, useQueryClient } from "@tanstack/react-query";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { toast } from "sonner";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { Modal } from "@/components/ui/modal";
import { Notice } from "@/components/ui/notice";
import { takeApartBlank } from "@/lib/client/blank";
import { boardKeys } from "@/lib/client/board";
import { messageOf } from "@/lib/client/fault-from-server";
import type { BlankMemberOnWire, Board } from "@/lib/schemas/board";

type Blank = NonNullable<Board["blank"]>;

export function BlankBoards({ board, blank, mayEdit }: { board: Board; blank: Blank; mayEdit: boolean }) {
  const { print } = useUnits();
  return (
    <div className="flex flex-col gap-2">
      <p className="text-pencil">
        {blank.glued ? "Glued up." : "Not glued up yet: the cut order begins with it."} From the upper edge down,{" "}
        {print(blank.jointing)} jointed off each glued edge.
      </p>
      <ol className="divide-y divide-rule">
        {blank.members.map((member) => (
          <Member key={member.boardId} member={member} />
        ))}
      </ol>
      {mayEdit && !blank.issued && !blank.glued && <TakeApart board={board} />}
    </div>
  );
}

function Member({ member }: { member: BlankMemberOnWire }) {
  const { print } = useUnits();
  const { boardId, tag, species, place, side, endForEnd, rect, takes } = member;
  const lies = [side === "back" && "back up", endForEnd && "turned end for end", rect.x > 0 && `${print(rect.x)} in`];
  const taken = [
    takes.upper > 0 && `${print(takes.upper)} off the upper edge`,
    takes.lower > 0 && `${print(takes.lower)} off the lower`,
  ];
  return (
    <li className="flex flex-wrap items-baseline gap-x-3 py-1.5">
      <Link href={`/rack/${boardId}`} className="measure text-base text-chalk underline-offset-2 hover:underline">
        {tag}
      </Link>
      <span>
        {species}
        {place && `, ${place}`}
      </span>
      <span className="text-sm text-pencil">{[...lies, ...taken].filter(Boolean).join(", ")}</span>
      <span className="measure ml-auto">{print(rect.height)} wide</span>
    </li>
  );
}

function TakeApart({ board }: { board: Board }) {
  const router = useRouter();
  const client = useQueryClient();
  const [asking, setAsking] = useState(false);
  const apart = useMutation({
    mutationFn: () => takeApartBlank(board.id),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: boardKeys.all });
      toast.success(`${board.tag} is taken apart, its boards are free again`);
      setAsking(false);
      router.refresh();
    },
  });
  return (
    <>
      <Button size="small" className="self-start" onClick={() => setAsking(true)}>
        Take this blank apart
      </Button>
      <Modal
        open={asking}
        onOpenChange={setAsking}
        title={`Take ${board.tag} apart?`}
        lead="Its boards are free again. Its tag and its story stay, its place in the rack does not."
      >
        <div className="flex flex-col gap-4">
          {apart.error && <Notice kind="stop">{messageOf(apart.error)}</Notice>}
          <div className="flex flex-wrap gap-2">
            <Button kind="danger" disabled={apart.isPending} onClick={() => apart.mutate()}>
              Take it apart
            </Button>
            <Button onClick={() => setAsking(false)}>Keep it</Button>
          </div>
        </div>
      </Modal>
    </>
  );
}
