import { PassThrough } from "node:stream";
import { createReadableStreamFromReadable } from "@react-router/node";
import { isbot } from "isbot";
import { renderToPipeableStream, type RenderToPipeableStreamOptions } from "react-dom/server";
import { ServerRouter, type EntryContext, type HandleErrorFunction, type RouterContextProvider } from "react-router";
import { clientAddressContext } from "#app/web/client-address.ts";
import { logError } from "#app/web/log.server.ts";
import { nonceContext } from "#app/web/nonce.ts";
import { startBackgroundWork } from "#app/web/background.server.ts";

// The server in front sets these through the build's entry module: they must be the same objects as in here.
export { clientAddressContext, nonceContext };

export const streamTimeout = 5_000;

startBackgroundWork();

export default function handleRequest(request: Request, status: number, headers: Headers, entryContext: EntryContext, loadContext: RouterContextProvider) {
  if (request.method.toUpperCase() === "HEAD") return new Response(null, { status, headers });
  const nonce = loadContext.get(nonceContext) || undefined;
  const userAgent = request.headers.get("user-agent");

  return new Promise<Response>((resolve, reject) => {
    let isShellRendered = false;
    let responseStatus = status;
    // Crawlers get the whole page at once.
    const readyOption: keyof RenderToPipeableStreamOptions = userAgent && isbot(userAgent) ? "onAllReady" : "onShellReady";
    const { pipe, abort } = renderToPipeableStream(<ServerRouter context={entryContext} url={request.url} nonce={nonce} />, {
      nonce,
      [readyOption]() {
        isShellRendered = true;
        const body = new PassThrough({
          final(callback) {
            clearTimeout(timeout);
            callback();
          },
        });
        headers.set("Content-Type", "text/html; charset=utf-8");
        pipe(body);
        resolve(new Response(createReadableStreamFromReadable(body), { headers, status: responseStatus }));
      },
      onShellError: reject,
      onError(error: unknown) {
        responseStatus = 500;
        // Before the shell is out the rejection above reports it.
        if (isShellRendered) logError(error, request);
      },
    });
    const timeout = setTimeout(() => abort(), streamTimeout + 1_000);
  });
}

export const handleError: HandleErrorFunction = (error, { request }) => {
  if (!request.signal.aborted) logError(error, request);
};
