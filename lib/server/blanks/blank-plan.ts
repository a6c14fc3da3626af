/** A blank's plan as the core takes it, from the rows of its boards and of the pictures they were planned with. */
import "server-only";
import type { listMembers } from "@/db/queries/blank";
import { type BlankMember, blankStrips, type KeepClear, type PlacedMember, type StripLayout, type Um } from "@/lib/layout";

type MemberRows = Awaited<ReturnType<typeof listMembers>>[number];

export interface DrawnOnMember {
  readonly keepClear: readonly KeepClear[];
  readonly glueLines: readonly { readonly across: Um }[];
}

/** Where a board lies: enough for strips. */
export function placedMember({ member, straightening }: Pick<MemberRows, "member" | "straightening">): PlacedMember {
  return {
    id: member.boardId,
    length: straightening.length,
    width: straightening.width,
    endForEnd: member.endForEnd,
    along: member.along,
    trim: { upper: member.trimUpper, lower: member.trimLower },
  };
}

/** A board with all that was drawn on its picture. */
export function drawnMember(rows: MemberRows, { keepClear, glueLines }: DrawnOnMember): BlankMember {
  return {
    ...placedMember(rows),
    thickness: rows.board.thickness,
    outline: rows.straightening.outline,
    keepClear,
    glueLines: glueLines.map(({ across }) => across),
  };
}

/** Of a blank that stands in the database. It was laid out when it was planned, and nothing its strips rest on changes. */
export function stripsOf(members: readonly Pick<MemberRows, "member" | "straightening">[], jointing: Um): StripLayout {
  const outcome = blankStrips({ members: members.map(placedMember), jointing });
  if (!outcome.ok) throw new Error(`a planned blank cannot be laid out: ${JSON.stringify(outcome.refusal)}`);
  return outcome.layout;
}
