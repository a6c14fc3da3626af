"use client";
/** Movement of the wood on the table: what is known from the server, worked out with the layout as it is shown now. */
import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useMemo } from "react";
import { toast } from "sonner";
import { messageOf } from "@/lib/client/fault-from-server";
import { faceMovementQuery, movementKeys, saveFaceMovement } from "@/lib/client/movement";
import { type FaceMovement, faceMovement, type MovementRequest } from "@/lib/layout";
import type { FaceMovementFacts, MovementChoices } from "@/lib/schemas/movement";
import { type FaceWoods, faceWoods, movementRequest } from "@/lib/schemas/movement-request";
import { useEditorState, useTableContext } from "./table-context";
import { useLiveLayout } from "./use-live-layout";

export interface Movement {
  readonly facts: FaceMovementFacts;
  readonly woods: FaceWoods;
  readonly request: MovementRequest;
  readonly outcome: FaceMovement;
}

/** Null until the server has answered; an error where it does not. */
export function useMovement(): { readonly movement: Movement | null; readonly error: Error | null } {
  const layout = useLiveLayout();
  const { data: facts, error } = useQuery(useFactsQuery());
  const woods = useMemo(() => (facts ? faceWoods(facts) : null), [facts]);
  const movement = useMemo(() => {
    if (!facts || !woods) return null;
    const request = movementRequest(layout, facts, woods);
    return { facts, woods, request, outcome: faceMovement(request) };
  }, [layout, facts, woods]);
  return { movement, error };
}

function useFactsQuery() {
  const { faceId } = useTableContext();
  const boards = useEditorState((state) => state.boards);
  return useMemo(
    () =>
      faceMovementQuery(
        faceId,
        boards.map(({ face }) => face.id),
      ),
    [faceId, boards],
  );
}

/**
 * Changes what was chosen for the face: shown at once, sent one after another, each from the revision that the last one left. What the
 * server does not take is read anew.
 */
export function useChoose() {
  const { faceId } = useTableContext();
  const client = useQueryClient();
  const { queryKey } = useFactsQuery();
  const set = (change: (facts: FaceMovementFacts) => FaceMovementFacts) =>
    client.setQueryData<FaceMovementFacts>(queryKey, (facts) => facts && change(facts));
  return useMutation({
    scope: { id: `movement of ${faceId}` },
    onMutate: async (change: (present: MovementChoices) => Partial<MovementChoices>) => {
      // An answer that is on its way would undo what is shown.
      await client.cancelQueries({ queryKey });
      set((facts) => ({ ...facts, choices: { ...facts.choices, ...change(facts.choices) } }));
    },
    mutationFn: async () => {
      const facts = client.getQueryData<FaceMovementFacts>(queryKey);
      if (!facts) throw new Error("a choice was made before there was anything to choose from");
      return saveFaceMovement(faceId, { ...facts.choices, baseRevision: facts.revision });
    },
    // Choices that are on their way already stay as they are shown.
    onSuccess: (saved) => set(({ choices }) => ({ ...saved, choices })),
    onError: (error) => {
      toast.error(messageOf(error));
      void client.invalidateQueries({ queryKey: movementKeys.face(faceId) });
    },
  });
}
