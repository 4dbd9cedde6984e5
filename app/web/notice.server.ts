import { createCookieSessionStorage } from "react-router";
import { runtimeEnv } from "./runtime.server.ts";

/** One sentence carried over a redirect: "Taken in as MQ-T-26-0231." */
export type Notice = { text: string; tone: "done" | "caution" };

function storage() {
  const env = runtimeEnv();
  return createCookieSessionStorage<{ notice: Notice }>({
    cookie: { name: "notice", path: "/", httpOnly: true, sameSite: "lax", secure: env.isCookieSecure, secrets: [env.SESSION_SECRET], maxAge: 60 },
  });
}

export async function noticeHeader(text: string, tone: Notice["tone"] = "done"): Promise<string> {
  const session = await storage().getSession();
  session.flash("notice", { text, tone });
  return storage().commitSession(session);
}

/** The notice of this request, and the header that clears it. */
export async function takeNotice(request: Request): Promise<{ notice: Notice | null; header: string | null }> {
  const session = await storage().getSession(request.headers.get("cookie"));
  const notice = session.get("notice") ?? null;
  return { notice, header: notice ? await storage().destroySession(session) : null };
}
