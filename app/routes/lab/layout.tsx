import { Outlet } from "react-router";
import { labContext } from "#app/web/contexts.server.ts";
import { labMiddleware } from "#app/web/lab-middleware.server.ts";
import type { Route } from "./+types/layout";

export const middleware: Route.MiddlewareFunction[] = [labMiddleware];

// A guarded layout keeps a loader: without one a client-side navigation could skip the server and the guard with it.
export function loader({ context }: Route.LoaderArgs) {
  const { laboratory, person, roles } = context.get(labContext);
  return { laboratory, person, roles };
}

export default function LabLayout() {
  return <Outlet />;
}
