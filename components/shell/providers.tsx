"use client";
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { Tooltip } from "radix-ui";
import { type ReactNode, useState } from "react";
import { Toaster } from "sonner";
import { FaultFromServer } from "@/lib/client/fault-from-server";

/** A refusal will not get better by asking again; a broken connection may. */
const retry = (failures: number, error: Error) => failures < 2 && !(error instanceof FaultFromServer);

/** Also without a network: what cannot be sent fails and is said, instead of waiting unseen for a connection. */
const networkMode = "always";

export function Providers({ children }: { children: ReactNode }) {
  const [client] = useState(
    () =>
      new QueryClient({
        defaultOptions: { queries: { retry, networkMode, staleTime: 10_000 }, mutations: { retry: false, networkMode } },
      }),
  );
  return (
    <QueryClientProvider client={client}>
      <Tooltip.Provider delayDuration={400}>{children}</Tooltip.Provider>
      <Toaster position="bottom-center" toastOptions={{ className: "!rounded-md !border-rule !font-sans" }} />
    </QueryClientProvider>
  );
}
