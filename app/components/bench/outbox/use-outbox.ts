import { useQuery, useQueryClient } from "@tanstack/react-query";
import { useCallback, useEffect } from "react";
import { useRevalidator } from "react-router";
import { flushOutbox } from "./flush-outbox.ts";
import { deedsOf, type Whose } from "./outbox.ts";
import { onOutboxChange } from "./outbox-news.ts";
import type { KeptDeed } from "./outbox-store.ts";

const retryEveryMs = 4_000;
const none: readonly KeptDeed[] = [];

/** What waits on this device for one stone; sent as soon as the line is there, and the page brought up to date after. */
export function useOutbox({ person, labSlug }: Whose, stoneCode: string): readonly KeptDeed[] {
  const queries = useQueryClient();
  const { revalidate } = useRevalidator();
  const { data: deeds = none } = useQuery({ queryKey: ["outbox", person, labSlug, stoneCode], queryFn: () => deedsOf({ person, labSlug }, stoneCode), networkMode: "always", retry: false });
  useEffect(() => onOutboxChange(() => void queries.invalidateQueries({ queryKey: ["outbox"] })), [queries]);

  const flush = useCallback(async () => {
    const { sent } = await flushOutbox({ person, labSlug });
    if (sent > 0) void revalidate();
  }, [person, labSlug, revalidate]);
  const isWaiting = deeds.some(({ refusal }) => refusal === null);
  useEffect(() => {
    if (!isWaiting) return;
    void flush();
    const timer = setInterval(() => void flush(), retryEveryMs);
    const now = () => void flush();
    window.addEventListener("online", now);
    return () => {
      clearInterval(timer);
      window.removeEventListener("online", now);
    };
  }, [isWaiting, flush]);
  return deeds;
}
