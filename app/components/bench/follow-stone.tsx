import { useQuery } from "@tanstack/react-query";
import { useEffect } from "react";
import { useRevalidator } from "react-router";

const everyMs = 3_000;

/** Brings in what a colleague records on the same stone within seconds, without touching what is being typed. */
export function FollowStone({ base, mark }: { base: string; mark: number }) {
  const { revalidate, state } = useRevalidator();
  const { data: latest } = useQuery({
    queryKey: ["stone-mark", base],
    queryFn: async ({ signal }) => {
      const response = await fetch(`${base}/mark.json`, { signal });
      if (!response.ok) throw new Error(`stone mark: ${response.status}`);
      return ((await response.json()) as { mark: number }).mark;
    },
    refetchInterval: everyMs,
    retry: false,
    initialData: mark,
  });
  useEffect(() => {
    if (latest > mark && state === "idle") void revalidate();
  }, [latest, mark, revalidate, state]);
  return null;
}
