import { createElement } from "react";
import { redirect } from "react-router";
import { RegisterUnknownPage } from "#app/components/register/register-unknown-page.tsx";
import { parseRegisterCode } from "#app/domain/register-code.ts";
import { registerResponse } from "#app/web/register-response.server.ts";
import type { Route } from "./+types/ask";

export function loader({ url }: Route.LoaderArgs) {
  const typed = (url.searchParams.get("code") ?? "").slice(0, 60);
  if (typed === "") return registerResponse(createElement(RegisterUnknownPage, { typed, reason: "ask" }));
  const code = parseRegisterCode(typed);
  if (code) return redirect(`/v/${code}`);
  return registerResponse(createElement(RegisterUnknownPage, { typed, reason: "malformed" }), { status: 400 });
}
