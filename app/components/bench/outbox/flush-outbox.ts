import { askServer } from "./ask-server.ts";
import { deedsOf, dropDeed, markRefused, type Whose } from "./outbox.ts";
import { sendOutbox, type Outcome } from "./send-outbox.ts";

/** Sends what waits on this device for this person; one page of the browser at a time. */
export function flushOutbox(whose: Whose): Promise<Outcome> {
  const send = () => sendOutbox({ deeds: () => deedsOf(whose), ask: askServer, drop: dropDeed, refuse: markRefused });
  return navigator.locks.request(`isogyre-outbox-${whose.labSlug}`, send);
}
