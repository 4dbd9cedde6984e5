import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { useState, type ReactNode } from "react";

/** The bench's live data: candidates, colleagues' readings, what waits on this device. */
export function BenchQueries({ children }: { children: ReactNode }) {
  const [queries] = useState(() => new QueryClient());
  return <QueryClientProvider client={queries}>{children}</QueryClientProvider>;
}
