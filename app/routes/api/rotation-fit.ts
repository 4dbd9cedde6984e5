import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import { parseRotationRun } from "#app/gemmology/rotation/parse-rotation-run.ts";
import { apiDoor } from "#app/web/api-door.server.ts";
import { problem } from "#app/web/problem.server.ts";
import type { Route } from "./+types/rotation-fit";

const title = "Rotation run not understood";

/** `POST /api/v1/rotation-fit`: one rotation run in, the fit out. */
export function action({ request, context }: Route.ActionArgs) {
  return apiDoor({ request, context }, (value) => {
    const parsed = parseRotationRun(value);
    if (!parsed.ok) return problem({ status: 422, title, detail: parsed.errors.map(({ path, message }) => `${path || "run"} ${message}`).join("; "), errors: parsed.errors });
    try {
      return Response.json(fitRotation(parsed.run), { headers: { "Cache-Control": "no-store" } });
    } catch (error) {
      if (error instanceof RangeError) return problem({ status: 422, title, detail: error.message });
      throw error;
    }
  });
}

export function loader({ request, context }: Route.LoaderArgs) {
  return apiDoor({ request, context }, () => problem({ status: 405, title: "Method not allowed", detail: "Send the rotation run by POST." }));
}
