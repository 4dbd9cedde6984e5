import { beforeAll, describe, expect, inject, test } from "vitest";
import type { RouteConfigEntry } from "@react-router/dev/routes";
import { addressOf, roles, routeLines, type RouteLine } from "./route-lines.ts";
import { signAllIn } from "./world.ts";

const { url } = inject("journey");
let cookies: Awaited<ReturnType<typeof signAllIn>>;
let lines: RouteLine[];
beforeAll(async () => {
  [cookies, lines] = await Promise.all([signAllIn(), routeLines()]);
});

type Answer = { status: number; location: string; body: string };
async function ask(path: string, { method = "GET", cookie = "" }: { method?: string; cookie?: string } = {}): Promise<Answer> {
  const answer = await fetch(url + path, { method, redirect: "manual", headers: { cookie, ...(method === "POST" && { origin: url, "content-type": "application/x-www-form-urlencoded" }) }, ...(method === "POST" && { body: "" }) });
  const type = answer.headers.get("content-type") ?? "";
  return { status: answer.status, location: answer.headers.get("location") ?? "", body: /text|json/.test(type) ? await answer.text() : (await answer.arrayBuffer(), "") };
}
const methodsOf = (line: RouteLine) => [...(line.get ? (["GET"] as const) : []), ...(line.post ? (["POST"] as const) : [])];
const accessOf = (line: RouteLine, method: string) => (method === "GET" ? line.get : line.post)!;
const isAllowed = (line: RouteLine, method: string, role: string) => Array.isArray(accessOf(line, method)) && (accessOf(line, method) as readonly string[]).includes(role);
const inLab = () => lines.filter(({ path }) => path.startsWith("lab/"));
/** What sits before the sign-in page says nothing of whether there is such a row. */
const toSignIn = ({ status, location }: Answer) => (status === 302 || status === 303) && location.startsWith("/sign-in");

test("every route of the manifest has a line, and every method that it answers", async () => {
  const { default: config } = await import("#app/routes.ts");
  const { readFileSync } = await import("node:fs");
  const flat = (entries: readonly RouteConfigEntry[], base = ""): Array<{ path: string; file: string }> =>
    entries.flatMap((entry) => {
      const path = [base, entry.path].filter(Boolean).join("/");
      return entry.children ? flat(entry.children, path) : [{ path, file: entry.file }];
    });
  const routes = flat(await config);
  expect(lines.map(({ path }) => path).sort()).toEqual(routes.map(({ path }) => path).sort());
  for (const { path, file } of routes) {
    const source = readFileSync(`app/${file}`, "utf8");
    const line = lines.find((candidate) => candidate.path === path)!;
    const hasAction = /export (async )?function action|export const action|export const \{[^}]*action|action[,:].*createRouteHandler/.test(source);
    expect({ path, hasPost: line.post !== undefined }).toEqual({ path, hasPost: hasAction });
  }
});

describe("in a laboratory", () => {
  test("nobody gets in without a living session", async () => {
    for (const line of inLab())
      for (const method of methodsOf(line))
        for (const cookie of ["", cookies.revoked, cookies.expired, "session=eyJub3QiOiJvdXJzIn0%3D"]) {
          const answer = await ask(addressOf(line), { method, cookie });
          expect(toSignIn(answer), `${method} ${line.path} ${answer.status}`).toBe(true);
        }
  });

  test("each role opens and sends what is its own, and is told that the rest isn't", async () => {
    for (const line of inLab())
      for (const method of methodsOf(line))
        for (const role of roles) {
          const { status } = await ask(addressOf(line), { method, cookie: cookies[role] });
          const where = `${method} ${line.path} as ${role}: ${status}`;
          // What a report's authorisation needs depends on the stone, so its empty form is refused as such first.
          const isFormFirst = method === "POST" && line.path.endsWith("/report");
          if (!isAllowed(line, method, role)) expect([403, ...(method === "GET" ? [404] : []), ...(isFormFirst ? [422, 400] : [])], where).toContain(status);
          else if (method === "GET") expect(status, where).toBe(line.getStatus ?? 200);
          else expect([400, 409, 422, 403], where).toContain(status); // an empty form: refused, yet not a failure
        }
  });

  test("another laboratory's owner finds nothing, neither at its address nor by its numbers at their own", async () => {
    for (const line of inLab())
      for (const method of methodsOf(line)) {
        const there = await ask(addressOf(line), { method, cookie: cookies.otherOwner });
        expect(there.status, `${method} ${line.path}`).toBe(404);
        if (!line.params) continue;
        const here = await ask(addressOf(line, { labSlug: "tarn-and-vale" }), { method, cookie: cookies.otherOwner });
        if (line.isShared) expect(here.status, `${method} ${line.path} at home`).toBe(200);
        else expect([404, ...(method === "POST" ? [400, 422] : [])], `${method} ${line.path} at home: ${here.status}`).toContain(here.status);
        expect(here.body).not.toMatch(/Marram Quay|Ferro|Ardenne Estate|Castellan/);
      }
  });

  test("what is another's looks like what isn't there", async () => {
    const missing: Record<string, string> = { stoneCode: "TV-26-9999-1", number: "TV-X-26-99999", clientRef: "zzzzzzzzzz", instrumentRef: "zzzzzzzzzz", photoRef: "zzzzzzzzzz", sequence: "1" };
    for (const line of inLab().filter(({ params, get, isShared }) => params && get && !isShared)) {
      const theirs = await ask(addressOf(line, { labSlug: "tarn-and-vale" }), { cookie: cookies.otherOwner });
      const nobodys = await ask(addressOf({ ...line, params: Object.fromEntries(Object.keys(line.params!).map((name) => [name, missing[name]!])) }, { labSlug: "tarn-and-vale" }), { cookie: cookies.otherOwner });
      expect(theirs.status, line.path).toBe(nobodys.status);
      const words = ({ body }: Answer) => /<main[\s\S]*<\/main>/.exec(body)?.[0].replace(/<[^>]*>/g, " ").replace(/\s+/g, " ").trim();
      expect(words(theirs), line.path).toBe(words(nobodys));
    }
  });

  test("a client is no member", async () => {
    for (const line of inLab()) for (const method of methodsOf(line)) expect((await ask(addressOf(line), { method, cookie: cookies.client })).status, `${method} ${line.path}`).toBe(404);
  });
});

describe("outside a laboratory", () => {
  test("what asks for a sign-in sends there, what is open answers everybody, and nothing fails", async () => {
    for (const line of lines.filter(({ path }) => !path.startsWith("lab/")))
      for (const method of methodsOf(line)) {
        const answer = await ask(addressOf(line), { method });
        const where = `${method} ${line.path}: ${answer.status}`;
        expect(answer.status, where).toBeLessThan(500);
        if (accessOf(line, method) === "signedIn") expect(toSignIn(answer), where).toBe(true);
        else if (method === "GET" && !line.bySecret) expect(answer.status, where).toBe(line.getStatus ?? 200);
      }
  });

  test("a client's PDF is theirs alone", async () => {
    const line = lines.find(({ path }) => path === "my/reports/:code/:fileName")!;
    // MQ-R-26-00005 is Linnea Ardenne's.
    expect((await ask(addressOf(line), { cookie: cookies.client })).status).toBe(200);
    for (const person of ["owner", "otherOwner", "appraiser"] as const) expect((await ask(addressOf(line), { cookie: cookies[person] })).status).toBe(404);
  });
});

test("another site's page can send nothing", async () => {
  const unguarded = new Set(["webhooks/stripe", "api/uploadthing", "api/v1/rank", "api/v1/rotation-fit", "api/v1/density"]);
  for (const line of lines.filter(({ post, path }) => post && !unguarded.has(path)))
    for (const headers of [{ origin: "https://elsewhere.example" }, { "sec-fetch-site": "cross-site", origin: url }, { "sec-fetch-site": "same-site" }, { origin: "null" }] as Array<Record<string, string>>) {
      const answer = await fetch(url + addressOf(line), { method: "POST", redirect: "manual", headers: { cookie: cookies.owner, "content-type": "application/x-www-form-urlencoded", ...headers }, body: "" });
      // React Router itself answers 400 to a foreign origin; a form that was read and refused says so at its fields.
      expect([400, 403], `${line.path} ${JSON.stringify(headers)}`).toContain(answer.status);
      expect(await answer.text(), line.path).not.toMatch(/aria-invalid="true"|name="requestId"/);
      expect(answer.headers.getSetCookie(), line.path).toEqual([]);
    }
});

test("every answer carries the strict headers", async () => {
  for (const line of lines)
    for (const method of methodsOf(line))
      for (const cookie of ["", cookies.owner]) {
        const { headers } = await fetch(url + addressOf(line), { method, redirect: "manual", headers: { cookie, ...(method === "POST" && { origin: url }) } }).then(async (answer) => (await answer.arrayBuffer(), answer));
        const where = `${method} ${line.path}`;
        const policy = headers.get("content-security-policy") ?? "";
        expect(policy, where).toMatch(/default-src 'none'/);
        expect(policy, where).toMatch(/frame-ancestors '(none|self)'/);
        expect(policy, where).not.toMatch(/script-src[^;]*('unsafe|https?:)/);
        if (line.path.startsWith("v") && !line.path.includes("json") && !line.path.includes("jpg")) expect(policy, where).toContain("script-src 'none'");
        expect(headers.get("x-content-type-options"), where).toBe("nosniff");
        expect(headers.get("referrer-policy"), where).toBe("same-origin");
        expect(headers.get("cross-origin-opener-policy"), where).toBe("same-origin");
        expect(headers.get("cross-origin-resource-policy"), where).toBe("same-origin");
        expect(headers.get("permissions-policy"), where).toContain("microphone=()");
        expect(headers.get("x-powered-by"), where).toBeNull();
        if (cookie && line.path.startsWith("lab/")) expect(headers.get("cache-control"), where).toMatch(/private/);
      }
});
