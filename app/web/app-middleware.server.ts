import type { MiddlewareFunction } from "react-router";
import { clientAddressContext } from "./client-address.ts";
import { appContext } from "./contexts.server.ts";
import { getRuntime } from "./runtime.server.ts";
import { requireSameOrigin } from "./same-origin.server.ts";

/** The first thing on every request: refuse another site's writes, then say through what this one acts. */
export const appMiddleware: MiddlewareFunction<Response> = async ({ request, context }) => {
  const { db, services } = getRuntime();
  requireSameOrigin(request, services.publicOrigin);
  context.set(appContext, { db, services, now: new Date(), clientAddress: context.get(clientAddressContext) });
};
