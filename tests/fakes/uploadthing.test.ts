import { createServer, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { createRouteHandler, createUploadthing, UTApi, UTFile, type FileRouter } from "uploadthing/server";
import { afterEach, beforeEach, expect, test } from "vitest";
import { createUploads } from "#app/integrations/uploads.server.ts";
import { startFakeUploadThing, type FakeUploadThing } from "#fakes/uploadthing/server.ts";

let fake: FakeUploadThing;
let app: Server;
let appUrl: string;
let completed: { stoneId: string; key: string; name: string }[];

const f = createUploadthing();
const router = {
  photo: f({ image: { maxFileSize: "4MB", maxFileCount: 2 } })
    .middleware(() => ({ stoneId: "stone-1" }))
    .onUploadComplete(({ metadata, file }) => {
      completed.push({ stoneId: metadata.stoneId, key: file.key, name: file.name });
      return { stored: file.name };
    }),
} satisfies FileRouter;

beforeEach(async () => {
  completed = [];
  fake = await startFakeUploadThing();
  app = createServer();
  await new Promise<void>((done) => app.listen(0, "127.0.0.1", done));
  appUrl = `http://127.0.0.1:${(app.address() as AddressInfo).port}/api/uploadthing`;
  const handle = createRouteHandler({ router, config: { token: fake.token, ingestUrl: fake.url, callbackUrl: appUrl, isDev: false, logLevel: "None" } });
  app.on("request", async (incoming, outgoing) => {
    const chunks: Buffer[] = [];
    for await (const chunk of incoming) chunks.push(chunk as Buffer);
    const request = new Request(new URL(incoming.url!, appUrl), { method: incoming.method, headers: incoming.headers as Record<string, string>, ...(incoming.method === "POST" && { body: Buffer.concat(chunks) }) });
    const response = await handle(request);
    outgoing.writeHead(response.status, Object.fromEntries(response.headers)).end(Buffer.from(await response.arrayBuffer()));
  });
});
afterEach(async () => {
  await fake.close();
  app.closeAllConnections();
  await new Promise((done) => app.close(done));
});

const aPicture = (name = "stone.png", size = 2_000) => new File([new Uint8Array(size).fill(7)], name, { type: "image/png" });

/** The browser's SDK sends with XMLHttpRequest, which Node has not: this is the same request. */
async function sendTo(url: string, file: File) {
  const body = new FormData();
  body.append("file", file);
  return fetch(url, { method: "PUT", body, headers: { Range: "bytes=0-" } });
}

async function presigned(file: File): Promise<{ url: string; key: string }> {
  const answer = await fetch(`${appUrl}?actionType=upload&slug=photo`, {
    method: "POST",
    headers: { "Content-Type": "application/json", "x-uploadthing-package": "isogyre-tests", "x-uploadthing-version": "7.7.4" },
    body: JSON.stringify({ files: [{ name: file.name, size: file.size, type: file.type, lastModified: file.lastModified }] }),
  });
  expect(answer.status).toBe(200);
  return ((await answer.json()) as { url: string; key: string }[])[0]!;
}

test("a file sent to the address that the route signed is stored, and the application is called back", async () => {
  const file = aPicture("émeraude 1.png");
  const { url, key } = await presigned(file);
  const head = await fetch(url, { method: "HEAD" });
  expect(head.headers.get("x-ut-range-start")).toBe("0");
  const answer = await (await sendTo(url, file)).json();
  expect(answer).toMatchObject({ ufsUrl: `${fake.url}/f/${key}`, serverData: { stored: "émeraude 1.png" } });
  expect(completed).toEqual([{ stoneId: "stone-1", key, name: "émeraude 1.png" }]);
  const stored = await fetch(`${fake.url}/f/${key}`);
  expect(stored.headers.get("content-type")).toBe("image/png");
  expect(Buffer.from(await stored.arrayBuffer())).toEqual(Buffer.from(await file.arrayBuffer()));
});

test("an address altered in size, name or key takes no file", async () => {
  const file = aPicture();
  const { url, key } = await presigned(file);
  for (const altered of [url.replace("x-ut-file-size=2000", "x-ut-file-size=2001"), url.replace("stone.png", "stone.svg"), url.replace(key, `${key}x`)]) {
    expect(altered).not.toBe(url);
    expect((await sendTo(altered, file)).status).toBe(403);
  }
  expect((await sendTo(url, aPicture("stone.png", 1_999))).status).toBe(400);
  expect(fake.store.list()).toEqual([]);
  expect(completed).toEqual([]);
});

test("a callback that the stand-in did not sign is refused by the SDK", async () => {
  const { key } = await presigned(aPicture());
  const body = JSON.stringify({ status: "uploaded", metadata: { stoneId: "stone-2" }, origin: fake.url, file: { name: "x.png", size: 1, type: "image/png", customId: null, key, url: "", appUrl: "", ufsUrl: "", fileHash: "", lastModified: 0 } });
  const answer = await fetch(`${appUrl}?slug=photo`, { method: "POST", body, headers: { "Content-Type": "application/json", "uploadthing-hook": "callback", "x-uploadthing-signature": `hmac-sha256=${"0".repeat(64)}` } });
  expect(answer.status).toBe(400);
  expect(completed).toEqual([]);
});

test("the server's SDK stores, lists, renames and deletes", async () => {
  const api = new UTApi({ token: fake.token, apiUrl: fake.url, ingestUrl: fake.url, logLevel: "Error" });
  const { data, error } = await api.uploadFiles(new UTFile([new Uint8Array([1, 2, 3])], "report.pdf", { type: "application/pdf" }));
  expect(error).toBeNull();
  expect((await api.listFiles()).files.map(({ name, key }) => [name, key])).toEqual([["report.pdf", data!.key]]);
  expect(await api.renameFiles({ fileKey: data!.key, newName: "report 2.pdf" })).toEqual({ success: true });
  expect((await api.getUsageInfo()).totalBytes).toBe(3);
  expect(await api.deleteFiles([data!.key, "no such key"])).toEqual({ success: true, deletedCount: 1 });
  expect((await fetch(`${fake.url}/f/${data!.key}`)).status).toBe(404);
});

test("files outlive a restart where they have a folder", async () => {
  const folder = mkdtempSync(path.join(tmpdir(), "isogyre-uploads-"));
  try {
    const first = await startFakeUploadThing({ folder });
    const { fileKey } = await createUploads({ token: first.token, apiUrl: first.url, ingestUrl: first.url, fileUrl: first.url }).put({ name: "a.jpg", mimeType: "image/jpeg", bytes: Buffer.from("picture") });
    await first.close();
    await using second = await startFakeUploadThing({ folder });
    const uploads = createUploads({ token: second.token, apiUrl: second.url, ingestUrl: second.url, fileUrl: second.url });
    expect(String(await uploads.get(fileKey))).toBe("picture");
    expect(await (await fetch(second.url)).text()).toContain("a.jpg");
    await uploads.remove([fileKey]);
    await expect(uploads.get(fileKey)).rejects.toThrow("404");
  } finally {
    rmSync(folder, { recursive: true });
  }
});

test("what the stand-in does not know it refuses: a call, another key", async () => {
  const post = (pathname: string, apiKey: string) => fetch(`${fake.url}${pathname}`, { method: "POST", body: "{}", headers: { "x-uploadthing-api-key": apiKey } });
  const unknown = await post("/v6/abolishFiles", fake.apiKey);
  expect(unknown.status).toBe(404);
  expect(await unknown.text()).toContain("does not know POST /v6/abolishFiles");
  expect((await post("/v6/listFiles", "sk_live_other")).status).toBe(401);
  expect((await fetch(`${fake.url}/elsewhere`)).status).toBe(404);
});
