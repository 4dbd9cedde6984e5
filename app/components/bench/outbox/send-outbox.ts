import type { KeptDeed } from "./outbox-store.ts";

/** What the server made of a deed: kept it, refuses it for good, or cannot be asked now. */
export type Answer = Readonly<{ is: "kept" } | { is: "refused"; message: string } | { is: "later"; because: "line" | "signedOut" }>;
export type Outcome = Readonly<{ sent: number; refused: number; stoppedBy: "line" | "signedOut" | null }>;

type SendOutboxInput = Readonly<{
  deeds: () => Promise<readonly KeptDeed[]>;
  ask: (deed: KeptDeed) => Promise<Answer>;
  drop: (place: number) => Promise<void>;
  refuse: (place: number, message: string) => Promise<void>;
}>;

/**
 * Sends what waits, one after the other, in the order of making. A deed leaves the device only after the server has said
 * that it is kept; cut at any moment, it is sent again, and the server keeps it once by its id. What is refused stays on
 * the device with its reason until a person decides, and holds nothing up.
 */
export async function sendOutbox({ deeds, ask, drop, refuse }: SendOutboxInput): Promise<Outcome> {
  let [sent, refused] = [0, 0];
  for (;;) {
    const next = (await deeds()).find(({ refusal }) => refusal === null);
    if (!next) return { sent, refused, stoppedBy: null };
    const answer = await ask(next);
    if (answer.is === "later") return { sent, refused, stoppedBy: answer.because };
    if (answer.is === "kept") {
      await drop(next.place);
      sent += 1;
    } else {
      await refuse(next.place, answer.message);
      refused += 1;
    }
  }
}
