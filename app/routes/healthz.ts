import type { Route } from "./+types/healthz";
import { AppError } from "#app/domain/app-error.ts";
import { checkHealth } from "#app/features/check-health.server.ts";
import { appContext } from "#app/web/contexts.server.ts";

export async function loader({ context }: Route.LoaderArgs) {
  try {
    await checkHealth(context.get(appContext));
    return new Response("ok\n", { headers: { "Content-Type": "text/plain", "Cache-Control": "no-store" } });
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    return new Response(`${error.userMessage}\n`, { status: error.status, headers: { "Content-Type": "text/plain", "Retry-After": "5" } });
  }
}
