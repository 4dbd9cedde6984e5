import { useCallback, useEffect, useState } from "react";
import { useRevalidator } from "react-router";
import { loadOutbox } from "./load-outbox.ts";
import type { Whose } from "./outbox.ts";
import type { KeptDeed } from "./outbox-store.ts";

const retryEveryMs = 4_000;
const none: readonly KeptDeed[] = [];

/** What waits on this device for one stone; sent as soon as the line is there, and the page brought up to date after. */
export function useOutbox({ person, labSlug }: Whose, stoneCode: string): readonly KeptDeed[] {
  const { revalidate } = useRevalidator();
  const [deeds, setDeeds] = useState(none);
  useEffect(() => {
    let [stop, isGone] = [() => {}, false];
    const follow = async () => {
      const { deedsOf, onOutboxChange } = await loadOutbox();
      const read = async () => {
        const now = await deedsOf({ person, labSlug }, stoneCode);
        if (!isGone) setDeeds((before) => (before.length === 0 && now.length === 0 ? before : now));
      };
      if (isGone) return;
      stop = onOutboxChange(() => void read());
      await read();
    };
    // A browser that keeps nothing has nothing waiting.
    follow().catch(() => {});
    return () => {
      isGone = true;
      stop();
    };
  }, [person, labSlug, stoneCode]);

  const flush = useCallback(async () => {
    const { sent } = await (await loadOutbox()).flushOutbox({ person, labSlug });
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
