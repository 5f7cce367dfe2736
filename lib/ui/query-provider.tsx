"use client";
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { type ReactNode, useState } from "react";
import { ApiProblem } from "./api";

/** Refusals are final and are not asked again; a lost network or a busy server is asked twice more. */
export function mayAskAgain(failures: number, error: unknown): boolean {
  if (error instanceof ApiProblem && error.status < 500) return false;
  return failures < 2;
}

/** The client's cache of what the server said. Acts are never repeated on their own: the outbox or the person does. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: { staleTime: 15_000, gcTime: 10 * 60_000, retry: mayAskAgain, refetchOnWindowFocus: true },
      mutations: { retry: false },
    },
  });
}

export function QueryProvider({ children }: { children: ReactNode }) {
  const [client] = useState(createQueryClient);
  return <QueryClientProvider client={client}>{children}</QueryClientProvider>;
}
