import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";

export type Handler = (request: IncomingMessage, response: ServerResponse, url: URL) => Promise<void> | void;

/** An HTTP server on loopback. `handlerFor` is given the origin, which is known only once a port is taken. */
export async function serveLoopback({ port = 0, handlerFor }: { port?: number; handlerFor: (origin: string) => Handler }) {
  const server = createServer();
  await new Promise<void>((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, "127.0.0.1", resolve);
  });
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const handler = handlerFor(url);
  server.on("request", async (request, response) => {
    try {
      await handler(request, response, new URL(request.url ?? "/", url));
    } catch (error) {
      if (response.headersSent) response.destroy();
      else sendJson(response, 500, { error: { type: "api_error", message: String(error) } });
    }
  });
  const close = () =>
    new Promise<void>((done) => {
      server.close(() => done());
      server.closeAllConnections();
    });
  return { url, close };
}

export function sendJson(response: ServerResponse, status: number, body: unknown, headers: Record<string, string> = {}): void {
  response.writeHead(status, { "Content-Type": "application/json", ...headers }).end(JSON.stringify(body));
}

export function sendPage(response: ServerResponse, html: string, status = 200): void {
  response
    .writeHead(status, {
      "Content-Type": "text/html; charset=utf-8",
      "Content-Security-Policy": "default-src 'none'; style-src 'unsafe-inline'; img-src data:; base-uri 'none'; frame-ancestors 'none'",
      "Cache-Control": "no-store",
    })
    .end(html);
}

export function redirect(response: ServerResponse, location: string): void {
  response.writeHead(303, { Location: location }).end();
}
