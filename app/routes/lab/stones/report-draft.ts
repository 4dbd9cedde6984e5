import { renderDraft } from "#app/features/reports/render-draft.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import { pdfResponse } from "#app/web/pdf-response.server.ts";
import type { Route } from "./+types/report-draft";

export async function loader({ context, params }: Route.LoaderArgs) {
  return pdfResponse(await orResponse(renderDraft(context.get(labContext), { stoneCode: params.stoneCode })), { isFramed: true });
}
