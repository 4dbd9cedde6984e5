import { data } from "react-router";
import { readSpectrumSource } from "#app/features/spectra/read-spectrum-source.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/spectrum-file";

/** The file of a spectrum as it came, to be kept, never shown: it was written by somebody else. */
export async function loader({ context, params }: Route.LoaderArgs) {
  const sequence = /^[1-9]\d{0,5}$/.test(params.sequence) ? Number(params.sequence) : 0;
  if (sequence === 0) throw data({ userMessage: "There is no such spectrum." }, { status: 404 });
  const { bytes, fileName } = await orResponse(readSpectrumSource(context.get(labContext), { stoneCode: params.stoneCode, sequence }));
  return new Response(new Uint8Array(bytes), {
    headers: {
      "Content-Type": "application/octet-stream",
      "Content-Length": String(bytes.length),
      "Content-Disposition": `attachment; filename="${fileName.replace(/[^\w.-]+/g, "_")}"; filename*=UTF-8''${encodeURIComponent(fileName)}`,
      "Cache-Control": "private, no-store",
      "Content-Security-Policy": "default-src 'none'; frame-ancestors 'none'; sandbox",
      "Cross-Origin-Resource-Policy": "same-origin",
    },
  });
}
