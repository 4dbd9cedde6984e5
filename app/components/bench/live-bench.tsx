import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { useState } from "react";
import { FollowStone } from "./follow-stone.tsx";
import { LiveCandidates, type LiveCandidatesProps } from "./live-candidates.tsx";

type LiveBenchProps = { base: string; mark: number; /** Null: the candidates are hidden. */ candidates: LiveCandidatesProps | null };

/** The bench's live data, after the page works: candidates as digits are typed, and what colleagues record on the same stone. */
export default function LiveBench({ base, mark, candidates }: LiveBenchProps) {
  const [queries] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={queries}>
      <FollowStone base={base} mark={mark} />
      {candidates ? <LiveCandidates {...candidates} /> : null}
    </QueryClientProvider>
  );
}
