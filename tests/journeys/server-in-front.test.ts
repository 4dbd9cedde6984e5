import http from "node:http";
import { expect, inject, test } from "vitest";

const { url } = inject("journey");

test("every answer carries the strict headers, with a new nonce each time", async () => {
  const [first, second] = [await fetch(url), await fetch(url)];
  const policy = first.headers.get("content-security-policy") ?? "";
  const nonce = /'nonce-([^']+)'/.exec(policy)?.[1];
  expect(nonce).toBeTruthy();
  expect(second.headers.get("content-security-policy")).not.toContain(nonce);
  expect(await first.text()).toContain(`nonce="${nonce}"`);
  expect(policy).toContain("'strict-dynamic'");
  expect(policy).toContain("frame-ancestors 'none'");
  for (const path of ["/", "/healthz", "/no-such-page", "/assets/none.js"]) {
    const { headers } = await fetch(url + path);
    expect(headers.get("x-content-type-options"), path).toBe("nosniff");
    expect(headers.get("content-security-policy"), path).toContain("object-src 'none'");
    expect(headers.get("referrer-policy"), path).toBe("same-origin");
    expect(headers.get("cross-origin-opener-policy"), path).toBe("same-origin");
    expect(headers.get("permissions-policy"), path).toContain("camera=(self)");
    expect(headers.get("x-powered-by"), path).toBeNull();
  }
});

test("the register's page keeps a policy of its own that allows no script", async () => {
  const { headers } = await fetch(`${url}/v/0000-0000-0000-0000`);
  expect(headers.get("content-security-policy")).toContain("script-src 'none'");
  expect(headers.get("content-security-policy")).not.toContain("nonce");
});

test("assets are kept for a year, pages for nobody signed in are asked for again", async () => {
  const page = await fetch(url);
  const asset = /\/assets\/[\w.-]+\.js/.exec(await page.text())![0];
  expect((await fetch(url + asset)).headers.get("cache-control")).toContain("immutable");
  expect(page.headers.get("cache-control")).toMatch(/no-(cache|store)/);
});

test.each([false, true])("a body over the limit is refused before it is read whole (chunked: %s)", async (isChunked) => {
  const status = await new Promise<number>((resolve, reject) => {
    const sizeBytes = 3 * 1024 ** 2;
    const request = http.request(`${url}/api/v1/rank`, { method: "POST", headers: { "Content-Type": "application/json", ...(isChunked ? { "Transfer-Encoding": "chunked" } : { "Content-Length": String(sizeBytes) }) } }, (response) => resolve(response.statusCode!));
    request.once("error", reject);
    request.end(Buffer.alloc(sizeBytes, 32));
  });
  expect(status).toBe(413);
});
