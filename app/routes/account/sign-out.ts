import { redirect } from "react-router";
import { endSession } from "#app/features/accounts/end-session.server.ts";
import { appContext } from "#app/web/contexts.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { endedSessionCookieHeader, readSessionToken } from "#app/web/session-cookie.server.ts";
import type { Route } from "./+types/sign-out";

export async function action({ request, context }: Route.ActionArgs) {
  const token = await readSessionToken(request);
  if (token) await endSession(context.get(appContext), token);
  const response = redirect("/sign-in");
  response.headers.append("Set-Cookie", await endedSessionCookieHeader());
  response.headers.append("Set-Cookie", await noticeHeader("You are signed out."));
  return response;
}

/** A link somebody else placed must not sign anybody out. */
export function loader() {
  return redirect("/");
}
