import { data, type MiddlewareFunction } from "react-router";
import { findLabActor } from "#app/features/laboratories/find-lab-actor.server.ts";
import { appContext, labContext, signedInContext } from "./contexts.server.ts";
import { readSessionToken } from "./session-cookie.server.ts";
import { signInRedirect } from "./sign-in-redirect.server.ts";

/** Settles once, for every page of a laboratory, who acts and in which one; others are sent to sign in, or told there is none. */
export const labMiddleware: MiddlewareFunction<Response> = async ({ request, params, context }, next) => {
  const app = context.get(appContext);
  const token = await readSessionToken(request);
  const actor = token ? await findLabActor(app, { token, labSlug: params.labSlug ?? "" }) : undefined;
  if (!actor) throw signInRedirect(request);
  const { signedIn, membership } = actor;
  if (!membership) throw data({ userMessage: "There is no such laboratory, or you are not one of its members." }, { status: 404 });
  context.set(signedInContext, signedIn);
  context.set(labContext, {
    db: app.db,
    services: app.services,
    now: app.now,
    actorId: signedIn.userId,
    laboratoryId: membership.laboratoryId,
    laboratory: membership.laboratory,
    roles: membership.roles,
    person: { name: signedIn.name, email: signedIn.email, title: membership.title },
  });
  const response = await next();
  if (!response.headers.has("Cache-Control")) response.headers.set("Cache-Control", "private, no-store");
  return response;
};
