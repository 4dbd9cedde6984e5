import type { MiddlewareFunction } from "react-router";
import { findSignedIn } from "#app/features/accounts/find-signed-in.server.ts";
import { appContext, signedInContext } from "./contexts.server.ts";
import { readSessionToken } from "./session-cookie.server.ts";
import { signInRedirect } from "./sign-in-redirect.server.ts";

/** Lets signed-in people pass; others go to the sign-in page and come back. */
export const signedInMiddleware: MiddlewareFunction<Response> = async ({ request, context }, next) => {
  const token = await readSessionToken(request);
  const signedIn = token ? await findSignedIn(context.get(appContext), token) : undefined;
  if (!signedIn) throw signInRedirect(request);
  context.set(signedInContext, signedIn);
  const response = await next();
  if (!response.headers.has("Cache-Control")) response.headers.set("Cache-Control", "private, no-store");
  return response;
};
