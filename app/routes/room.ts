import { redirect } from "react-router";
import { safeReturnPath } from "#app/web/safe-return-path.ts";
import { roomCookieHeader } from "#app/web/room.server.ts";
import type { Route } from "./+types/room";

export async function action({ request }: Route.ActionArgs) {
  const form = await request.formData();
  const room = form.get("room");
  return redirect(safeReturnPath(form.get("next"), "/"), {
    headers: { "Set-Cookie": roomCookieHeader(room === "light" || room === "dim" ? room : "system") },
  });
}

export function loader() {
  return redirect("/");
}
