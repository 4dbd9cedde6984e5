import { hydrostaticDensity } from "#app/gemmology/density/hydrostatic-density.ts";
import { parseWeighing } from "#app/gemmology/density/parse-weighing.ts";
import { weighingWarning } from "#app/gemmology/density/weighing-warning.ts";
import { apiDoor } from "#app/web/api-door.server.ts";
import { problem } from "#app/web/problem.server.ts";
import type { Route } from "./+types/density";

/** `POST /api/v1/density`: one weighing in, the density with its uncertainty and budget out, and a warning where the stone is too small for the balance. */
export function action({ request, context }: Route.ActionArgs) {
  return apiDoor({ request, context }, (value) => {
    const parsed = parseWeighing(value);
    if (!parsed.ok) return problem({ status: 422, title: "Weighing not understood", detail: parsed.errors.map(({ path, message }) => `${path || "weighing"} ${message}`).join("; "), errors: parsed.errors });
    const result = hydrostaticDensity(parsed.weighing);
    return Response.json({ ...result, warning: weighingWarning({ massAirCt: parsed.weighing.massAirCt, result }) }, { headers: { "Cache-Control": "no-store" } });
  });
}

export function loader({ request, context }: Route.LoaderArgs) {
  return apiDoor({ request, context }, () => problem({ status: 405, title: "Method not allowed", detail: "Send the weighing by POST." }));
}
