import { Outlet, useRouteLoaderData } from "react-router";
import { ErrorPage } from "#app/components/layout/error-page.tsx";
import { PublicShell } from "#app/components/layout/public-shell.tsx";
import { NoticeBar } from "#app/components/ui/notice.tsx";
import type { loader as rootLoader } from "#app/root.tsx";
import { privateMiddleware } from "#app/web/private-middleware.server.ts";
import type { Route } from "./+types/layout";

export const middleware: Route.MiddlewareFunction[] = [privateMiddleware];

// A layout with middleware keeps a loader, so that client-side navigation runs it.
export function loader() {
  return null;
}

export default function AccountLayout() {
  const root = useRouteLoaderData<typeof rootLoader>("root");
  return (
    <PublicShell room={root?.room ?? "system"} notice={<NoticeBar notice={root?.notice ?? null} />}>
      <div className="mx-auto max-w-2xl">
        <Outlet />
      </div>
    </PublicShell>
  );
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} homeTo="/sign-in" />;
}
