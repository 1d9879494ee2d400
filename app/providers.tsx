"use client";

import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { useState, type ReactNode } from "react";
import { CallError } from "@/lib/entry/fetcher";

/** What was refused stays refused; only a lost connection or a busy server is worth another try. */
const worthAnotherTry = (tries: number, error: Error) => tries < 2 && (!(error instanceof CallError) || error.status === 0 || error.status === 503);

/** One client per browser; on the server one for each request, so that nobody sees another's data. */
const newClient = () => new QueryClient({ defaultOptions: { queries: { staleTime: 5_000, retry: worthAnotherTry }, mutations: { retry: false } } });

/** Holds what the live parts of a page have read. */
export function Providers({ children }: { children: ReactNode }) {
  const [client] = useState(newClient);
  return <QueryClientProvider client={client}>{children}</QueryClientProvider>;
}
