import { AppError } from "#app/domain/app-error.ts";
import { parseRegisterCode } from "#app/domain/register-code.ts";
import { askRegister } from "#app/features/register/ask-register.server.ts";
import { appContext } from "#app/web/contexts.server.ts";
import type { Route } from "./+types/fingerprint";

/** What the comparison in the browser needs: the fingerprint of the PDF that was issued and how the report stands. */
export async function loader({ params, context }: Route.LoaderArgs) {
  const headers = { "Cache-Control": "no-store" };
  const code = parseRegisterCode(params.code);
  if (!code) return Response.json({ found: false }, { status: 404, headers });
  try {
    const entry = await askRegister(context.get(appContext), code);
    if (!entry) return Response.json({ found: false }, { status: 404, headers });
    return Response.json({ found: true, sha256: entry.pdfSha256, state: entry.state, reportNumber: entry.view.reportNumber }, { headers });
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    return Response.json({ found: false, userMessage: error.userMessage }, { status: error.status, headers: { ...headers, "Retry-After": String(error.retryAfterS ?? 60) } });
  }
}
