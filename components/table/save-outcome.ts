/** Sends a document and turns whatever may happen into an outcome that autosave understands. */
import { FaultFromServer, messageOf } from "@/lib/client/fault-from-server";
import { getLayout, saveLayout } from "@/lib/client/layout";
import { documentOf } from "@/lib/editor/document";
import type { SaveOutcome, SaveRequest } from "@/lib/editor/sync/sync";
import { faceLayoutSchema, type Layout } from "@/lib/schemas/layout";

/** `onElsewhere` is told what stands on the server when another window was first: it may have other boards, too. Never throws. */
export async function saveOutcome(
  faceId: string,
  { baseRevision, document }: SaveRequest,
  onElsewhere: (present: Layout) => void,
): Promise<SaveOutcome> {
  const { layout, crosscutSawId, ripSawId } = document;
  try {
    const body = { baseRevision, document: faceLayoutSchema.parse(layout), crosscutSawId, ripSawId };
    const { revision } = await saveLayout(faceId, body);
    return { kind: "saved", revision };
  } catch (error) {
    if (!(error instanceof FaultFromServer) || error.fault.code !== "conflict") return outcomeOfFailure(error);
  }
  try {
    const present = await getLayout(faceId);
    onElsewhere(present);
    const { revision, updatedBy } = present;
    return { kind: "conflict", theirs: { revision, updatedBy, document: documentOf(present) } };
  } catch (error) {
    return outcomeOfFailure(error);
  }
}

/** What may mend itself is tried again; a refusal is shown. */
function outcomeOfFailure(error: unknown): SaveOutcome {
  const mayMend = error instanceof TypeError || (error instanceof FaultFromServer && passing.has(error.fault.code));
  return mayMend ? { kind: "unreachable" } : { kind: "refused", message: messageOf(error) };
}

const passing: ReadonlySet<string> = new Set(["unexpected", "too-many-tries"]);
