import { Outlet, useRouteLoaderData } from "react-router";
import { ErrorPage } from "#app/components/layout/error-page.tsx";
import { PublicShell } from "#app/components/layout/public-shell.tsx";
import { NoticeBar } from "#app/components/ui/notice.tsx";
import type { loader as rootLoader } from "#app/root.tsx";
import { signedInContext } from "#app/web/contexts.server.ts";
import { signedInMiddleware } from "#app/web/signed-in-middleware.server.ts";
import type { Route } from "./+types/layout";

export const middleware: Route.MiddlewareFunction[] = [signedInMiddleware];

// A guarded layout keeps a loader, so that client-side navigation runs the guard.
export function loader({ context }: Route.LoaderArgs) {
  const { name, email } = context.get(signedInContext);
  return { name, email };
}

export default function MyLayout({ loaderData }: Route.ComponentProps) {
  const root = useRouteLoaderData<typeof rootLoader>("root");
  return (
    <PublicShell
      room={root?.room ?? "system"}
      notice={<NoticeBar notice={root?.notice ?? null} />}
      links={
        <>
          <span className="text-ink-2">{loaderData.name}</span>
          <a href="/account" className="text-tint">
            Account
          </a>
          <form method="post" action="/sign-out">
            <button className="cursor-pointer text-tint underline">Sign out</button>
          </form>
        </>
      }
    >
      <Outlet />
    </PublicShell>
  );
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} homeTo="/my" />;
}
