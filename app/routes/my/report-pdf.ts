import { parseRegisterCode } from "#app/domain/register-code.ts";
import { AppError } from "#app/domain/app-error.ts";
import { readMyReportPdf } from "#app/features/client-area/read-my-report-pdf.server.ts";
import { appContext, signedInContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import { pdfResponse } from "#app/web/pdf-response.server.ts";
import type { Route } from "./+types/report-pdf";

export async function loader({ context, params }: Route.LoaderArgs) {
  const code = parseRegisterCode(params.code);
  const { userId } = context.get(signedInContext);
  const found = code ? readMyReportPdf(context.get(appContext), { userId, code }) : Promise.reject(new AppError("not_found", "There is no such report among yours."));
  return pdfResponse(await orResponse(found));
}
