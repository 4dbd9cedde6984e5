import { ApiError } from "./api-error.ts";
import type { StripeState } from "./state.ts";

type Answer = { status: number; body: unknown };

/** The same key with the same request gives the first answer again; with another request it is refused. */
export function answerOnce(state: StripeState, { key, path, raw }: { key: string; path: string; raw: string }, run: () => Answer): Answer & { isReplayed: boolean } {
  const earlier = state.data.idempotency[key];
  if (earlier) {
    if (earlier.path !== path || earlier.raw !== raw) {
      const message = `Keys for idempotent requests can only be used with the same parameters they were first used with. Try using a key other than '${key}' if you meant to execute a different request.`;
      throw new ApiError(400, message, { type: "idempotency_error" });
    }
    return { status: earlier.status, body: earlier.body, isReplayed: true };
  }
  // A refused request throws and is not kept: the service keeps no answer either where nothing was carried out.
  const answer = run();
  state.data.idempotency[key] = { path, raw, status: answer.status, body: structuredClone(answer.body) };
  state.save();
  return { ...answer, isReplayed: false };
}
