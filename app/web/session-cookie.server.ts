import { createCookie } from "react-router";
import { sessionAbsoluteMs } from "#app/features/accounts/session-lifetime.ts";
import { runtimeEnv } from "./runtime.server.ts";

function cookie() {
  const { isCookieSecure } = runtimeEnv();
  return createCookie(isCookieSecure ? "__Host-session" : "session", {
    path: "/",
    httpOnly: true,
    sameSite: "lax",
    secure: isCookieSecure,
    maxAge: sessionAbsoluteMs / 1000,
  });
}

export async function readSessionToken(request: Request): Promise<string | undefined> {
  const value: unknown = await cookie().parse(request.headers.get("cookie"));
  return typeof value === "string" && /^[\w-]{43}$/.test(value) ? value : undefined;
}

export function sessionCookieHeader(token: string): Promise<string> {
  return cookie().serialize(token);
}

export function endedSessionCookieHeader(): Promise<string> {
  return cookie().serialize("", { maxAge: 0 });
}
