import { parseEvidence } from "#app/gemmology/ranking/parse-evidence.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { apiDoor } from "#app/web/api-door.server.ts";
import { problem } from "#app/web/problem.server.ts";
import type { Route } from "./+types/rank";

/** `POST /api/v1/rank`: one evidence object in, one ranking out. */
export function action({ request, context }: Route.ActionArgs) {
  return apiDoor({ request, context }, (value) => {
    const parsed = parseEvidence(value);
    if (!parsed.ok) return problem({ status: 422, title: "Evidence not understood", detail: parsed.errors.map(({ path, message }) => `${path || "evidence"} ${message}`).join("; "), errors: parsed.errors });
    return Response.json(rankSpecies(parsed.evidence, loadSpeciesTable().table), { headers: { "Cache-Control": "no-store" } });
  });
}

export function loader({ request, context }: Route.LoaderArgs) {
  return apiDoor({ request, context }, () => problem({ status: 405, title: "Method not allowed", detail: "Send the evidence by POST." }));
}
