import { redirect } from "react-router";
import { readSpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";
import { safeReturnPath } from "#app/web/safe-return-path.ts";
import { spectrumViewCookieHeader } from "#app/web/spectrum-view.server.ts";
import type { Route } from "./+types/spectrum-view";

/** Keeps how this browser draws spectra, and goes back. */
export async function action({ request }: Route.ActionArgs) {
  const form = await request.formData();
  const view = form.get("spectrum");
  return redirect(safeReturnPath(form.get("next"), "/"), { headers: { "Set-Cookie": spectrumViewCookieHeader(readSpectrumView(typeof view === "string" ? view : undefined)) } });
}

export function loader() {
  return redirect("/");
}
