import type { KeptDeed } from "./outbox-store.ts";
import type { Answer } from "./send-outbox.ts";

/** Statuses that say nothing of the deed itself: the server is busy, restarting, or in front of it something failed. */
const isForLater = (status: number) => status === 408 || status === 425 || status === 429 || status >= 500;

/** Puts one deed to the server. */
export async function askServer({ labSlug, stoneCode, kind, fields, madeAt }: KeptDeed, fetchIt: typeof fetch = fetch): Promise<Answer> {
  const form = new FormData();
  for (const [name, value] of fields) form.append(name, value);
  if (kind === "reading") form.set("madeAt", madeAt);
  else form.set("deed", "strike");
  try {
    // Where nobody is signed in any more, the answer leads elsewhere.
    const response = await fetchIt(`/lab/${labSlug}/stones/${stoneCode}/sent-readings`, { method: "POST", body: form, redirect: "manual", headers: { Accept: "application/json" } });
    if (response.type === "opaqueredirect" || response.status === 401) return { is: "later", because: "signedOut" };
    if (isForLater(response.status)) return { is: "later", because: "line" };
    const body = (await response.json().catch(() => null)) as { kept?: boolean; message?: string } | null;
    if (response.ok && body?.kept) return { is: "kept" };
    // Without words of ours it was not our server that answered.
    return body?.message ? { is: "refused", message: body.message } : { is: "later", because: "line" };
  } catch {
    return { is: "later", because: "line" };
  }
}
