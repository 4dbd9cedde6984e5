import { readReportPdf } from "#app/features/reports/read-report-pdf.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import { pdfResponse } from "#app/web/pdf-response.server.ts";
import type { Route } from "./+types/pdf";

export async function loader({ context, params }: Route.LoaderArgs) {
  return pdfResponse(await orResponse(readReportPdf(context.get(labContext), { number: params.number })), { isFramed: true });
}
