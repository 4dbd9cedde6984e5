import type { IncomingMessage, ServerResponse } from "node:http";
import { readBody } from "../read-body.ts";
import { sendJson } from "../serve-loopback.ts";
import type { FileStore, StoredFile } from "./file-store.ts";
import { isUrlSigned, signText } from "./signature.ts";

type Deps = { store: FileStore; apiKey: string; origin: string; urlsOf: (key: string) => { url: string; appUrl: string; ufsUrl: string } };
type Announced = {
  metadata: unknown;
  callbackUrl: string;
  callbackSlug: string;
  awaitServerData: boolean;
  /** In development the application listens on the answer of its own announcement instead of being called. */
  emit?: (line: unknown) => void;
};
type CallbackResult = { fileKey: string; callbackData?: unknown; error?: string };

const callbackTimeoutMs = 10_000;

/** Where files arrive: announced by the application, sent by the browser or by UTApi, then told to the application. */
export function createIngest({ store, apiKey, origin, urlsOf }: Deps) {
  const announcedByKey = new Map<string, Announced>();
  const waiting = new Map<string, (result: CallbackResult) => void>();

  async function announce(request: IncomingMessage, response: ServerResponse): Promise<void> {
    const { fileKeys, isDev, ...rest } = JSON.parse((await readBody(request)).toString("utf8")) as Announced & { fileKeys: string[]; isDev: boolean };
    let emit: Announced["emit"];
    if (isDev) {
      let leftCount = fileKeys.length;
      response.writeHead(200, { "Content-Type": "application/x-ndjson" }).flushHeaders();
      emit = (line) => {
        response.write(`${JSON.stringify(line)}\n`);
        if (--leftCount === 0) response.end();
      };
    }
    for (const key of fileKeys) announcedByKey.set(key, { ...rest, emit });
    if (!isDev) sendJson(response, 200, { ok: true });
  }

  async function takeResult(request: IncomingMessage, response: ServerResponse): Promise<void> {
    const result = JSON.parse((await readBody(request)).toString("utf8")) as CallbackResult;
    waiting.get(result.fileKey)?.(result);
    waiting.delete(result.fileKey);
    sendJson(response, 200, { ok: true });
  }

  async function takeFile(request: IncomingMessage, response: ServerResponse, url: URL): Promise<void> {
    if (!isUrlSigned(askedUrl(request), apiKey)) return sendJson(response, 403, { error: "Invalid signature" });
    const key = url.pathname.slice(1);
    // The SDK encodes these values twice.
    const field = (name: string) => {
      const value = url.searchParams.get(name);
      return value === null ? null : decodeURIComponent(value);
    };
    const form = await new Response(new Uint8Array(await readBody(request)), { headers: { "Content-Type": request.headers["content-type"] ?? "" } }).formData();
    const part = form.get("file");
    if (!(part instanceof Blob)) return sendJson(response, 400, { error: "There is no file in this request" });
    const bytes = Buffer.from(await part.arrayBuffer());
    const sizeBytes = Number(field("x-ut-file-size"));
    if (bytes.length !== sizeBytes) return sendJson(response, 400, { error: `The file has ${bytes.length} bytes, ${sizeBytes} were announced` });
    const file = store.put(
      {
        key,
        name: field("x-ut-file-name") ?? key,
        type: field("x-ut-file-type") ?? "application/octet-stream",
        customId: field("x-ut-custom-id"),
        acl: field("x-ut-acl") ?? "public-read",
        disposition: field("x-ut-content-disposition") ?? "inline",
      },
      bytes,
    );
    const announced = announcedByKey.get(key);
    const told = announced && field("x-ut-slug") ? await tell(file, announced) : { callbackData: null };
    if (told.error !== undefined) return sendJson(response, 200, { error: told.error });
    sendJson(response, 200, { ...urlsOf(key), fileHash: file.hash, serverData: told.callbackData });
  }

  /** Tells the application that a file is here and waits for what it has to say. */
  async function tell(file: StoredFile, announced: Announced): Promise<{ callbackData?: unknown; error?: string }> {
    const payload = JSON.stringify({
      status: "uploaded",
      metadata: announced.metadata,
      origin,
      file: { name: file.name, size: file.sizeBytes, type: file.type, customId: file.customId, key: file.key, ...urlsOf(file.key), fileHash: file.hash, lastModified: file.uploadedAt },
    });
    const signature = signText(payload, apiKey);
    let timer: NodeJS.Timeout | undefined;
    const result = new Promise<CallbackResult>((resolve) => {
      waiting.set(file.key, resolve);
      timer = setTimeout(() => resolve({ fileKey: file.key, error: "The application did not answer in time" }), callbackTimeoutMs);
    });
    try {
      if (announced.emit) announced.emit({ payload, signature, hook: "callback" });
      else {
        const callback = new URL(announced.callbackUrl); // comes without ?slug
        callback.searchParams.set("slug", announced.callbackSlug);
        const answer = await fetch(callback, {
          method: "POST",
          body: payload,
          headers: { "Content-Type": "application/json", "uploadthing-hook": "callback", "x-uploadthing-signature": signature },
        });
        if (!answer.ok) return { error: `Failed to run the callback (${answer.status})` };
      }
      return announced.awaitServerData ? await result : { callbackData: null };
    } finally {
      clearTimeout(timer);
      waiting.delete(file.key);
    }
  }

  return { announce, takeResult, takeFile, isSigned: (request: IncomingMessage) => isUrlSigned(askedUrl(request), apiKey) };
}

/** As the caller wrote it: a signature covers the host too, by whichever name it was reached. */
function askedUrl(request: IncomingMessage): string {
  return `http://${request.headers.host}${request.url}`;
}
