import { data } from "react-router";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { getPhoto } from "#app/features/photos/get-photo.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/photo";

/** A photograph through us: the keys of the file store stay on the server, and who may see it is asked each time. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const id = idFromShortRef<"attachment">(params.photoRef ?? "");
  if (!id) throw data({ userMessage: "There is no such photograph." }, { status: 404 });
  const { bytes, mimeType } = await orResponse(getPhoto(context.get(labContext), id, url.pathname.endsWith("/thumbnail") ? "thumbnail" : "full"));
  return new Response(new Uint8Array(bytes), {
    headers: {
      "Content-Type": mimeType,
      "Content-Length": String(bytes.length),
      "Content-Disposition": "inline",
      "Cache-Control": "private, max-age=31536000, immutable",
      "Content-Security-Policy": "default-src 'none'; frame-ancestors 'none'; sandbox",
      "Cross-Origin-Resource-Policy": "same-origin",
    },
  });
}
