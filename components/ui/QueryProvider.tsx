"use client";

import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { useState, type ReactNode } from "react";
import { ApiProblem } from "@/lib/client/api";

/** Holds what was fetched. A refusal is an answer and is not asked for again; a lost connection is. */
export function QueryProvider({ children }: { children: ReactNode }) {
  const [client] = useState(() => new QueryClient({
    defaultOptions: { queries: { staleTime: 5_000, retry: (count, error) => count < 2 && !(error instanceof ApiProblem && error.status >= 400 && error.status < 500) } },
  }));
  return <QueryClientProvider client={client}>{children}</QueryClientProvider>;
}
