import { AppError } from "#app/domain/app-error.ts";
import { parseRegisterCode } from "#app/domain/register-code.ts";
import { getRegisterPhoto } from "#app/features/register/get-register-photo.server.ts";
import { appContext } from "#app/web/contexts.server.ts";
import type { Route } from "./+types/photo";

export async function loader({ params, context }: Route.LoaderArgs) {
  const code = parseRegisterCode(params.code);
  if (!code) return new Response("not found\n", { status: 404 });
  try {
    const jpeg = await getRegisterPhoto(context.get(appContext), code);
    // A report's photograph never changes: a new one belongs to a new report with a code of its own.
    return new Response(new Uint8Array(jpeg), {
      headers: { "Content-Type": "image/jpeg", "Cache-Control": "public, max-age=86400, immutable", "Content-Security-Policy": "default-src 'none'; frame-ancestors 'none'; sandbox" },
    });
  } catch (error) {
    if (error instanceof AppError) return new Response("not found\n", { status: 404 });
    throw error;
  }
}
