import type { IncomingMessage, ServerResponse } from "node:http";
import { readBody } from "../read-body.ts";
import { sendJson, sendPage, serveLoopback } from "../serve-loopback.ts";
import { openFileStore } from "./file-store.ts";
import { filesPage } from "./files-page.ts";
import { createIngest } from "./ingest.ts";
import { callRestApi } from "./rest-api.ts";
import { makeToken } from "./signature.ts";

type Options = {
  port?: number;
  apiKey?: string;
  appId?: string;
  /** Files are kept there; in memory where absent. */
  folder?: string;
};

/** A stand-in for UploadThing on loopback: ingest, REST API and file host on one port. */
export async function startFakeUploadThing({ port, apiKey = "sk_live_stand_in", appId = "standin", folder }: Options = {}) {
  const store = openFileStore(folder);
  const server = await serveLoopback({
    port,
    handlerFor: (origin) => {
      const urlsOf = (key: string) => ({ url: `${origin}/f/${key}`, appUrl: `${origin}/a/${appId}/${key}`, ufsUrl: `${origin}/f/${key}` });
      const ingest = createIngest({ store, apiKey, origin, urlsOf });

      return async (request, response, url) => {
        const { pathname } = url;
        const method = request.method ?? "GET";
        allowOtherOrigins(request, response);
        if (method === "OPTIONS") return void response.writeHead(204).end();
        if (method === "PUT") return ingest.takeFile(request, response, url);
        if (method === "POST") {
          if (request.headers["x-uploadthing-api-key"] !== apiKey) return sendJson(response, 401, { error: "Invalid API key" });
          if (pathname === "/route-metadata") return ingest.announce(request, response);
          if (pathname === "/callback-result") return ingest.takeResult(request, response);
          if (pathname.startsWith("/v6/")) {
            const body = JSON.parse((await readBody(request)).toString("utf8") || "{}") as Record<string, unknown>;
            const answer = callRestApi({ store, apiKey, urlOf: (key) => urlsOf(key).ufsUrl }, pathname.slice("/v6/".length), body);
            if (answer) return sendJson(response, answer.status, answer.body);
          }
        }
        if (method === "GET" || method === "HEAD") {
          if (pathname === "/") return sendPage(response, filesPage(store));
          if (/^\/(f|a)\//.test(pathname)) return sendFile(response, { method, key: decodeURIComponent(pathname.split("/").at(-1)!), isSigned: ingest.isSigned(request) });
          // Before sending a file the browser asks how much of it is here already: nothing ever is.
          if (method === "HEAD") return void response.writeHead(ingest.isSigned(request) ? 200 : 403, { "x-ut-range-start": "0" }).end();
        }
        console.warn(`stand-in for UploadThing: unknown call ${method} ${pathname}`);
        sendJson(response, 404, { error: `The local stand-in for UploadThing does not know ${method} ${pathname}` });
      };
    },
  });

  function sendFile(response: ServerResponse, { method, key, isSigned }: { method: string; key: string; isSigned: boolean }): void {
    const file = store.find({ fileKey: key });
    if (!file) return sendJson(response, 404, { error: "File not found" });
    if (file.acl === "private" && !isSigned) return sendJson(response, 403, { error: "This file needs a signed URL" });
    response.writeHead(200, {
      "Content-Type": file.type,
      "Content-Length": file.sizeBytes,
      "Content-Disposition": `${file.disposition}; filename*=UTF-8''${encodeURIComponent(file.name)}`,
      "Content-Security-Policy": "default-src 'none'; sandbox",
      "X-Content-Type-Options": "nosniff",
    });
    response.end(method === "HEAD" ? undefined : store.bytes(key));
  }

  return {
    url: server.url,
    token: makeToken({ apiKey, appId }),
    apiKey,
    store,
    close: server.close,
    [Symbol.asyncDispose]: server.close,
  };
}

export type FakeUploadThing = Awaited<ReturnType<typeof startFakeUploadThing>>;

/** A browser sends files across origins, and must be able to read the one header of ours. */
function allowOtherOrigins(request: IncomingMessage, response: ServerResponse): void {
  response.setHeader("Access-Control-Allow-Origin", request.headers.origin ?? "*");
  response.setHeader("Access-Control-Expose-Headers", "x-ut-range-start");
  response.setHeader("Access-Control-Allow-Methods", "GET,HEAD,PUT,POST,OPTIONS");
  response.setHeader("Access-Control-Allow-Headers", request.headers["access-control-request-headers"] ?? "*");
}
