"use client";
/** Saving the drawing, and what somebody else saved meanwhile. */
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { boardKeys } from "@/lib/client/board";
import { FaultFromServer } from "@/lib/client/fault-from-server";
import { saveZones, straighteningKeys, straighteningQuery } from "@/lib/client/straightening";
import type { Straightening } from "@/lib/schemas/straightening";
import type { Zones } from "@/lib/schemas/zones";
import type { ZonesState } from "./use-zones";
import type { ZonesDoc } from "./zones-doc";

interface Sent {
  readonly doc: ZonesDoc;
  readonly revision: number;
}

export interface ZonesSaving {
  readonly saving: boolean;
  readonly error: Error | null;
  /** What the server holds instead, when it refused for that reason. */
  readonly theirs: Zones | null;
  save: () => void;
  keepMine: () => void;
  takeTheirs: () => void;
  decideLater: () => void;
}

export function useSaveZones(straightening: Straightening, zones: ZonesState): ZonesSaving {
  const client = useQueryClient();
  const [theirs, setTheirs] = useState<Zones | null>(null);
  const query = straighteningQuery(straightening.id);
  const save = useMutation({
    mutationFn: ({ doc, revision }: Sent) =>
      saveZones(straightening.id, {
        outline: doc.outline && [...doc.outline],
        keepClear: [...doc.keepClear],
        glueLines: [...doc.glueLines],
        revision,
      }),
    onSuccess: (saved, { doc }) => {
      zones.saved(doc, saved.revision);
      setTheirs(null);
      void client.invalidateQueries({ queryKey: boardKeys.all });
      void client.invalidateQueries({ queryKey: straighteningKeys.one(straightening.id) });
    },
    onError: async (error) => {
      if (!(error instanceof FaultFromServer) || error.fault.code !== "conflict") return;
      setTheirs((await client.fetchQuery({ ...query, staleTime: 0 })).zones);
    },
  });
  const conflict = save.error instanceof FaultFromServer && save.error.fault.code === "conflict";
  return {
    saving: save.isPending,
    error: conflict ? null : save.error,
    theirs,
    save: () => save.mutate({ doc: zones.doc, revision: zones.revision }),
    keepMine: () => theirs && save.mutate({ doc: zones.doc, revision: theirs.revision }),
    takeTheirs: () => {
      if (theirs) zones.takeTheirs(theirs);
      setTheirs(null);
      save.reset();
    },
    decideLater: () => setTheirs(null),
  };
}
