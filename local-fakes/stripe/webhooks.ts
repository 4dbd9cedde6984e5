import { createHmac } from "node:crypto";
import { newStripeId, nowSeconds, type EventRecord, type StripeState } from "./state.ts";

export const apiVersion = "2026-10-28.endive"; // what stripe 23.1.0 asks for

export type Webhooks = ReturnType<typeof createWebhooks>;

/** `t=<seconds>,v1=<hex HMAC-SHA256(secret, t.payload)>`, as the SDK verifies it */
export function signWebhook(payload: string, secret: string, atSeconds = nowSeconds()): string {
  return `t=${atSeconds},v1=${createHmac("sha256", secret).update(`${atSeconds}.${payload}`).digest("hex")}`;
}

type Options = { state: StripeState; secret: string; url?: string; retryDelaysMs?: readonly number[] };

/** Events as they occur, each delivered until it is taken, or held back until somebody releases it. */
export function createWebhooks({ state, secret, url, retryDelaysMs = [500, 1_000, 2_000, 4_000, 8_000, 16_000] }: Options) {
  let targetUrl = url;
  const stopping = new AbortController();
  const underway = new Set<Promise<void>>();

  async function attempt(record: EventRecord): Promise<boolean> {
    const payload = JSON.stringify(record.event, null, 2);
    const status = await fetch(targetUrl!, {
      method: "POST",
      body: payload,
      redirect: "manual",
      signal: AbortSignal.any([stopping.signal, AbortSignal.timeout(20_000)]),
      headers: { "Content-Type": "application/json; charset=utf-8", "Stripe-Signature": signWebhook(payload, secret), "User-Agent": "Stripe/1.0 (local stand-in)" },
    }).then(
      (response) => response.status,
      () => 0, // nobody answered
    );
    record.attempts.push({ at: Date.now(), status });
    if (!stopping.signal.aborted) state.save();
    return status >= 200 && status < 300;
  }

  async function deliverUntilTaken(record: EventRecord): Promise<void> {
    if (!targetUrl) return;
    for (const delayMs of [0, ...retryDelaysMs]) {
      await pause(delayMs, stopping.signal);
      if (stopping.signal.aborted || record.isHeld || (await attempt(record))) return;
    }
  }

  function start(record: EventRecord): Promise<void> {
    const delivery = deliverUntilTaken(record).finally(() => underway.delete(delivery));
    underway.add(delivery);
    return delivery;
  }

  return {
    setUrl: (newUrl: string) => void (targetUrl = newUrl),
    getUrl: () => targetUrl,

    /** @returns when the event was taken, or nothing more is tried */
    emit(type: string, object: unknown): Promise<void> {
      const id = newStripeId("evt");
      const event = {
        id,
        object: "event" as const,
        api_version: apiVersion,
        created: nowSeconds(),
        livemode: false as const,
        pending_webhooks: 1,
        request: { id: null, idempotency_key: null },
        type,
        data: { object: structuredClone(object) }, // as it was then, however late it arrives
      };
      const record: EventRecord = { event, isHeld: state.data.isHolding, attempts: [] };
      state.data.events[id] = record;
      state.save();
      return record.isHeld ? Promise.resolve() : start(record);
    },

    hold(): void {
      state.data.isHolding = true;
      state.save();
    },

    /** Delivers what was held, one after another, and goes back to delivering at once. */
    async release({ order = "asOccurred" }: { order?: "asOccurred" | "reversed" } = {}): Promise<void> {
      state.data.isHolding = false;
      const held = Object.values(state.data.events).filter((record) => record.isHeld);
      for (const record of held) record.isHeld = false;
      state.save();
      for (const record of order === "reversed" ? held.reverse() : held) await start(record);
    },

    /** Once more, delivered before or not: a held one is released by it. */
    async deliverAgain(eventId: string): Promise<void> {
      const record = state.data.events[eventId];
      if (!record) throw new Error(`there is no event ${eventId}`);
      record.isHeld = false;
      await start(record);
    },

    /** After a restart: what was never taken is tried again. */
    resume(): void {
      for (const record of Object.values(state.data.events)) if (!record.isHeld && !isTaken(record)) void start(record);
    },

    settled: async () => void (await Promise.all(underway)),

    async stop(): Promise<void> {
      stopping.abort();
      await Promise.all(underway);
    },
  };
}

export function isTaken(record: EventRecord): boolean {
  return record.attempts.some(({ status }) => status >= 200 && status < 300);
}

function pause(ms: number, signal: AbortSignal): Promise<void> {
  if (ms === 0 || signal.aborted) return Promise.resolve();
  return new Promise((resolve) => {
    const timer = setTimeout(resolve, ms);
    signal.addEventListener("abort", () => (clearTimeout(timer), resolve()), { once: true });
  });
}
