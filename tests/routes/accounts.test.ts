import { createCookie, RouterContextProvider } from "react-router";
import { expect, inject, test, vi } from "vitest";
import type { AppContext } from "#app/features/app-context.ts";
import { findSignedIn } from "#app/features/accounts/find-signed-in.server.ts";
import { startSession } from "#app/features/accounts/start-session.server.ts";
import { action as forgot } from "#app/routes/account/forgot-password.tsx";
import { action as signIn, loader as signInPage } from "#app/routes/account/sign-in.tsx";
import { action as signOut } from "#app/routes/account/sign-out.ts";
import { action as signUp } from "#app/routes/account/sign-up.tsx";
import { appContext } from "#app/web/contexts.server.ts";
import { requireSameOrigin } from "#app/web/same-origin.server.ts";
import { aNewLaboratory, anApp, aPerson, aRequestId } from "../setup/an-app.ts";

const origin = "http://127.0.0.1:3000";
const uploadToken = Buffer.from(JSON.stringify({ apiKey: "sk_x", appId: "x", regions: ["x"] })).toString("base64");
const environment = { DATABASE_URL: inject("serverUrl"), PUBLIC_ORIGIN: origin, SESSION_SECRET: "s".repeat(40), STRIPE_SECRET_KEY: "sk_test_x", STRIPE_WEBHOOK_SECRET: "whsec_x", UPLOADTHING_TOKEN: uploadToken, SMTP_URL: "smtp://127.0.0.1:9", ISOGYRE_DEMO: "0" };
// Cookies ask the environment whether the site is behind https; rows come from the test's own context.
for (const [name, value] of Object.entries(environment)) vi.stubEnv(name, value);

function ask(route: unknown, app: AppContext, path: string, { body, cookie = "" }: { body?: Record<string, string>; cookie?: string } = {}) {
  const url = new URL(path, origin);
  const request = new Request(url, { method: body ? "POST" : "GET", headers: { cookie, "user-agent": "Test" }, ...(body && { body: new URLSearchParams(body) }) });
  const context = new RouterContextProvider();
  context.set(appContext, app);
  return (route as (args: unknown) => Promise<unknown>)({ request, context, params: {}, url });
}

type Answer = { data: { result: { error?: Record<string, string[]>; initialValue?: Record<string, string> } }; init: { status: number; headers?: Record<string, string> } };
const sessionHeader = (response: Response) => response.headers.getSetCookie().find((line) => line.startsWith("session="))!;
const tokenIn = async (header: string) => (await createCookie("session").parse(header.split(";")[0]!)) as string;

test("signing in starts a session of its own, whatever cookie the browser came with, and ends the old one", async () => {
  const app = await anApp();
  const [person, other] = [await aPerson(app), await aPerson(app)];
  const planted = await startSession(app, { userId: other.userId, userAgent: "" });
  const cookie = (await createCookie("session").serialize(planted)).split(";")[0]!;
  const response = (await ask(signIn, app, "/sign-in?next=/account", { body: { email: person.email, password: person.password }, cookie })) as Response;
  expect([response.status, response.headers.get("Location")]).toEqual([302, "/account"]);
  const header = sessionHeader(response);
  expect(header).toMatch(/; HttpOnly/i);
  expect(header).toMatch(/; SameSite=Lax/i);
  expect(await tokenIn(header)).not.toBe(planted);
  expect(await findSignedIn(app, planted)).toBeUndefined();
  expect(await findSignedIn(app, await tokenIn(header))).toMatchObject({ userId: person.userId });
});

test("a sign-in never leads to another site", async () => {
  const app = await anApp();
  const { email, password } = await aPerson(app);
  for (const next of ["https://evil.example/", "//evil.example", "/\\evil.example", "javascript:alert(1)"]) {
    const response = (await ask(signIn, app, `/sign-in?next=${encodeURIComponent(next)}`, { body: { email, password } })) as Response;
    expect(response.headers.get("Location")).toBe("/laboratories");
  }
});

test("a refused sign-in keeps the address, never the password, and looks the same for a stranger", async () => {
  const app = await anApp();
  const { email } = await aPerson(app);
  const known = (await ask(signIn, app, "/sign-in", { body: { email, password: "a wrong password" } })) as Answer;
  const unknown = (await ask(signIn, app, "/sign-in", { body: { email: "nobody.at.all@example.test", password: "a wrong password" } })) as Answer;
  expect(known.init.status).toBe(422);
  expect(known.init).toEqual(unknown.init);
  expect(known.data.result.error).toEqual(unknown.data.result.error);
  expect(known.data.result.initialValue).toEqual({ email });
  expect(JSON.stringify([known, unknown])).not.toContain("a wrong password");
});

test("the eleventh try answers 429 and says when to come back", async () => {
  const app = await anApp();
  const { email } = await aPerson(app);
  for (let at = 0; at < 10; at++) await ask(signIn, app, "/sign-in", { body: { email, password: "a wrong password" } });
  const closed = (await ask(signIn, app, "/sign-in", { body: { email, password: "a wrong password" } })) as Answer;
  expect(closed.init).toEqual({ status: 429, headers: { "Retry-After": "900" } });
  expect(closed.data.result.error?.[""]?.[0]).toBe("There were too many tries to sign in to this account. Try again in 15 minutes.");
});

test("the demonstration's password is not on the page where the demonstration is off", async () => {
  expect(await ask(signInPage, await anApp(), "/sign-in")).toEqual({ demonstration: null });
});

test("signing out ends the session, not only the cookie", async () => {
  const app = await anApp();
  const { email, password } = await aPerson(app);
  const header = sessionHeader((await ask(signIn, app, "/sign-in", { body: { email, password } })) as Response);
  const response = (await ask(signOut, app, "/sign-out", { body: {}, cookie: header.split(";")[0] })) as Response;
  expect(sessionHeader(response)).toMatch(/Max-Age=0/);
  expect(await findSignedIn(app, await tokenIn(header))).toBeUndefined();
});

test("sign-up and reset answer a known address as they answer an unknown one, no sooner and no later", async () => {
  const app = await anApp();
  const { email } = await aPerson(app);
  const laboratory = aNewLaboratory();
  const answers = [];
  for (const address of [email, `nobody.${aRequestId()}@example.test`]) {
    const body = { name: "Iva Sorrel", email: address, password: "plinth otter cadmium", requestId: aRequestId(), laboratoryName: laboratory.name, slug: laboratory.slug, prefix: laboratory.prefix, practice: "sole", timeZone: "UTC", currency: "EUR" };
    const response = (await ask(signUp, app, "/sign-up", { body })) as Response;
    const startedAt = performance.now();
    const reset = (await ask(forgot, app, "/forgot-password", { body: { email: address, requestId: aRequestId() } })) as Response;
    expect(performance.now() - startedAt).toBeGreaterThan(380);
    answers.push([response.status, response.headers.get("Location"), reset.status, reset.headers.get("Location"), reset.headers.getSetCookie()]);
  }
  expect(answers[0]![1]).toBe("/sign-up/sent");
  expect(answers[0]).toEqual(answers[1]);
});

test("a form that another site sent does nothing", () => {
  const sent = (headers: Record<string, string>) => () => requireSameOrigin(new Request(`${origin}/sign-out`, { method: "POST", headers }), origin);
  for (const headers of [{ "sec-fetch-site": "cross-site" }, { "sec-fetch-site": "same-site" }, { origin: "https://evil.example" }, { origin: "null" }]) {
    expect(sent(headers as unknown as Record<string, string>)).toThrow();
  }
  expect(sent({ "sec-fetch-site": "same-origin", origin })).not.toThrow();
});
