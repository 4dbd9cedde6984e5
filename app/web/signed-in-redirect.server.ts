import { redirect } from "react-router";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { endSession } from "#app/features/accounts/end-session.server.ts";
import { startSession } from "#app/features/accounts/start-session.server.ts";
import { noticeHeader } from "./notice.server.ts";
import { readSessionToken, sessionCookieHeader } from "./session-cookie.server.ts";

/** Signs a person in and sends them on. The token is always new and an old session ends, so none can be planted beforehand. */
export async function signedInRedirect(app: AppContext, request: Request, { userId, to, notice }: { userId: UserId; to: string; notice?: string }): Promise<Response> {
  const old = await readSessionToken(request);
  if (old) await endSession(app, old);
  const token = await startSession(app, { userId, userAgent: request.headers.get("user-agent") ?? "" });
  const response = redirect(to);
  response.headers.append("Set-Cookie", await sessionCookieHeader(token));
  if (notice) response.headers.append("Set-Cookie", await noticeHeader(notice));
  return response;
}
