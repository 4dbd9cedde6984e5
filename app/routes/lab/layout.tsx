import { Outlet, useRouteLoaderData } from "react-router";
import { ErrorPage } from "#app/components/layout/error-page.tsx";
import { LabShell } from "#app/components/layout/lab-shell.tsx";
import { NoticeBar } from "#app/components/ui/notice.tsx";
import { isAllowed, type Operation } from "#app/domain/permissions.ts";
import type { loader as rootLoader } from "#app/root.tsx";
import { labContext } from "#app/web/contexts.server.ts";
import { labMiddleware } from "#app/web/lab-middleware.server.ts";
import type { Route } from "./+types/layout";

export const middleware: Route.MiddlewareFunction[] = [labMiddleware];

const places: ReadonlyArray<{ label: string; path: string; operation: Operation }> = [
  { label: "Logbook", path: "stones", operation: "stones.read" },
  { label: "Take-in", path: "take-ins/new", operation: "takeIn.create" },
  { label: "Reports", path: "reports", operation: "reports.read" },
  { label: "Invoices", path: "invoices", operation: "invoices.read" },
  { label: "Clients", path: "clients", operation: "clients.read" },
  { label: "Instruments", path: "instruments", operation: "instruments.read" },
  { label: "Species", path: "species", operation: "laboratory.read" },
  { label: "Laboratory", path: "settings", operation: "laboratory.manage" },
];

// A guarded layout keeps a loader: without one a client-side navigation could skip the server and the guard with it.
export function loader({ context, url }: Route.LoaderArgs) {
  const { laboratory, person, roles } = context.get(labContext);
  const nav = places.filter(({ operation }) => isAllowed(roles, operation)).map(({ label, path }) => ({ label, to: `/lab/${laboratory.slug}/${path}` }));
  return { laboratory: { slug: laboratory.slug, name: laboratory.name, timeZone: laboratory.timeZone }, person: { name: person.name, email: person.email }, roles, nav, search: url.searchParams.get("q") ?? "" };
}

export { keepsLayout as shouldRevalidate } from "#app/components/layout/line-state.ts";

export default function LabLayout({ loaderData }: Route.ComponentProps) {
  const root = useRouteLoaderData<typeof rootLoader>("root");
  return (
    <LabShell {...loaderData} room={root?.room ?? "system"} notice={<NoticeBar notice={root?.notice ?? null} />}>
      <Outlet />
    </LabShell>
  );
}

export function ErrorBoundary({ error, params }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} homeTo={params.labSlug ? `/lab/${params.labSlug}/stones` : "/"} />;
}
