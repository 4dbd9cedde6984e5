import { getStoneMark } from "#app/features/stones/get-stone-mark.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/mark";

/** Asked every few seconds by a bench that is open: whether somebody else has changed the stone. */
export async function loader({ context, params }: Route.LoaderArgs) {
  return Response.json({ mark: await orResponse(getStoneMark(context.get(labContext), params)) }, { headers: { "Cache-Control": "private, no-store" } });
}
