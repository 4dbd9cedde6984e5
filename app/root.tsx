import { Links, Meta, Outlet, Scripts, ScrollRestoration, data, useRouteLoaderData } from "react-router";
import { documentFonts } from "#app/components/layout/document-fonts.ts";
import { ErrorPage } from "#app/components/layout/error-page.tsx";
import { appMiddleware } from "#app/web/app-middleware.server.ts";
import { takeNotice } from "#app/web/notice.server.ts";
import { roomOf } from "#app/web/room.server.ts";
import type { Route } from "./+types/root";
import "./app.css";

export const middleware: Route.MiddlewareFunction[] = [appMiddleware];

export async function loader({ request }: Route.LoaderArgs) {
  const { notice, header } = await takeNotice(request);
  return data({ room: roomOf(request), notice }, header ? { headers: { "Set-Cookie": header } } : {});
}

export { keepsLayout as shouldRevalidate } from "#app/components/layout/line-state.ts";

export const meta: Route.MetaFunction = () => [{ title: "Isogyre" }];

export const links: Route.LinksFunction = () => [...documentFonts, { rel: "icon", href: "/favicon.ico", sizes: "32x32" }, { rel: "icon", href: "/favicon.svg", type: "image/svg+xml" }];

export function Layout({ children }: { children: React.ReactNode }) {
  const root = useRouteLoaderData<typeof loader>("root");
  const room = root?.room ?? "system";
  return (
    <html lang="en" data-room={room === "system" ? undefined : room}>
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="color-scheme" content={room === "dim" ? "dark" : room === "light" ? "light" : "light dark"} />
        <Meta />
        <Links />
      </head>
      <body>
        {children}
        <ScrollRestoration />
        <Scripts />
      </body>
    </html>
  );
}

export default function App() {
  return <Outlet />;
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} />;
}
