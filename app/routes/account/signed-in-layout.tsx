import { Outlet, useRouteLoaderData } from "react-router";
import { ErrorPage } from "#app/components/layout/error-page.tsx";
import { PublicShell } from "#app/components/layout/public-shell.tsx";
import { NoticeBar } from "#app/components/ui/notice.tsx";
import type { loader as rootLoader } from "#app/root.tsx";
import { signedInContext } from "#app/web/contexts.server.ts";
import { signedInMiddleware } from "#app/web/signed-in-middleware.server.ts";
import type { Route } from "./+types/signed-in-layout";

export const middleware: Route.MiddlewareFunction[] = [signedInMiddleware];

// A guarded layout keeps a loader, so that client-side navigation runs the guard.
export function loader({ context }: Route.LoaderArgs) {
  return { name: context.get(signedInContext).name };
}

export default function SignedInLayout({ loaderData }: Route.ComponentProps) {
  const root = useRouteLoaderData<typeof rootLoader>("root");
  return (
    <PublicShell
      room={root?.room ?? "system"}
      notice={<NoticeBar notice={root?.notice ?? null} />}
      links={
        <>
          <span className="text-ink-2">{loaderData.name}</span>
          <a href="/laboratories" className="inline-flex min-h-6 items-center text-tint">
            Laboratories
          </a>
          <a href="/account" className="inline-flex min-h-6 items-center text-tint">
            Account
          </a>
          <form method="post" action="/sign-out">
            <button className="min-h-6 cursor-pointer text-tint underline">Sign out</button>
          </form>
        </>
      }
    >
      <Outlet />
    </PublicShell>
  );
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} homeTo="/" />;
}
