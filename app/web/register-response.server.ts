import { renderToStaticMarkup } from "react-dom/server";

/** A page without script: its own policy forbids any, whatever the server in front sets for the rest. */
const policy = "default-src 'none'; script-src 'none'; style-src 'unsafe-inline'; img-src 'self'; font-src 'self'; form-action 'self'; base-uri 'none'; frame-ancestors 'none'";

export function registerResponse(page: React.ReactElement, { status = 200, headers = {} }: { status?: number; headers?: Record<string, string> } = {}): Response {
  return new Response(`<!doctype html>${renderToStaticMarkup(page)}`, {
    status,
    headers: { "Content-Type": "text/html; charset=utf-8", "Content-Security-Policy": policy, "Cache-Control": "no-cache", ...headers },
  });
}
