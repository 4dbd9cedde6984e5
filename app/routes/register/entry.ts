import { createElement } from "react";
import { RegisterPage } from "#app/components/register/register-page.tsx";
import { RegisterUnknownPage } from "#app/components/register/register-unknown-page.tsx";
import { AppError } from "#app/domain/app-error.ts";
import { parseRegisterCode } from "#app/domain/register-code.ts";
import { askRegister } from "#app/features/register/ask-register.server.ts";
import { appContext } from "#app/web/contexts.server.ts";
import { registerResponse } from "#app/web/register-response.server.ts";
import type { Route } from "./+types/entry";

export async function loader({ params, request, context }: Route.LoaderArgs) {
  const code = parseRegisterCode(params.code);
  if (!code) return registerResponse(createElement(RegisterUnknownPage, { typed: params.code.slice(0, 60), reason: "malformed" }), { status: 404 });
  try {
    const entry = await askRegister(context.get(appContext), code);
    if (!entry) return registerResponse(createElement(RegisterUnknownPage, { typed: params.code, reason: "unknown" }), { status: 404 });
    // The version moves with every change of the entry, so an old page is never taken for the present one.
    const etag = `"${entry.code}-${entry.version}"`;
    if (request.headers.get("if-none-match") === etag) return new Response(null, { status: 304, headers: { ETag: etag, "Cache-Control": "no-cache" } });
    return registerResponse(createElement(RegisterPage, { entry }), { headers: { ETag: etag } });
  } catch (error) {
    if (!(error instanceof AppError) || error.code !== "rate_limited") throw error;
    return registerResponse(createElement(RegisterUnknownPage, { typed: params.code, reason: "tooMany" }), {
      status: 429,
      headers: { "Retry-After": String(error.retryAfterS ?? 60) },
    });
  }
}
