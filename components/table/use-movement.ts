"use client";
/** Movement of the wood on the table: what is known from the server, worked out with the layout as it is shown now. */
import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useMemo } from "react";
import { toast } from "sonner";
import { FaultFromServer, messageOf } from "@/lib/client/fault-from-server";
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
  const { faceId } = useTableContext();
  const layout = useLiveLayout();
  const boards = useEditorState((state) => state.boards);
  const boardIds = useMemo(() => boards.map(({ face }) => face.id), [boards]);
  const { data: facts, error } = useQuery(faceMovementQuery(faceId, boardIds));
  const woods = useMemo(() => (facts ? faceWoods(facts) : null), [facts]);
  const movement = useMemo(() => {
    if (!facts || !woods) return null;
    const request = movementRequest(layout, facts, woods);
    return { facts, woods, request, outcome: faceMovement(request) };
  }, [layout, facts, woods]);
  return { movement, error };
}

/** Saves a change of what was chosen for the face. One after another: each starts from what the last one left. */
export function useChoose(facts: FaceMovementFacts) {
  const { faceId } = useTableContext();
  const client = useQueryClient();
  const queryKey = movementKeys.face(faceId);
  return useMutation({
    scope: { id: `movement of ${faceId}` },
    mutationFn: (change: Partial<MovementChoices>) => {
      const [, present = facts] = client.getQueriesData<FaceMovementFacts>({ queryKey }).at(-1) ?? [];
      return saveFaceMovement(faceId, { ...present.choices, ...change, baseRevision: present.revision });
    },
    onSuccess: (saved) => client.setQueriesData({ queryKey }, saved),
    onError: (error) => {
      toast.error(messageOf(error));
      if (error instanceof FaultFromServer && error.fault.code === "conflict") void client.invalidateQueries({ queryKey });
    },
  });
}
