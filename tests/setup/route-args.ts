import { RouterContextProvider } from "react-router";
import type { LabContext } from "#app/features/lab-context.ts";
import { appContext, labContext } from "#app/web/contexts.server.ts";

// What the process would be started with: routes read it for cookies; nothing here is reached over the network.
Object.assign(process.env, {
  DATABASE_URL: "mysql://nobody@127.0.0.1:9/none",
  PUBLIC_ORIGIN: "http://127.0.0.1:3000",
  SESSION_SECRET: "a secret for tests, longer than thirty-two",
  STRIPE_SECRET_KEY: "sk_test_nowhere",
  STRIPE_WEBHOOK_SECRET: "whsec_test",
  UPLOADTHING_TOKEN: Buffer.from(JSON.stringify({ apiKey: "sk_test", appId: "test", regions: ["local"] })).toString("base64"),
  SMTP_URL: "smtp://127.0.0.1:9",
});

/** What a loader or an action of a laboratory's page is called with, once its middleware has settled who acts. */
export function routeArgs(ctx: LabContext, { path, params = {}, form }: { path: string; params?: Record<string, string>; form?: Record<string, string | readonly string[] | File> }) {
  const url = new URL(`http://127.0.0.1:3000/lab/${ctx.laboratory.slug}${path}`);
  const body = form && new FormData();
  for (const [name, value] of Object.entries(form ?? {})) for (const one of Array.isArray(value) ? (value as readonly string[]) : [value as string | File]) body!.append(name, one);
  const context = new RouterContextProvider();
  context.set(labContext, ctx);
  context.set(appContext, { db: ctx.db, now: ctx.now, services: ctx.services, clientAddress: "127.0.0.1" });
  const request = new Request(url, body ? { method: "POST", body } : {});
  // The generated argument types differ by route only in their params, which the caller knows.
  return { request, url, context, params: { labSlug: ctx.laboratory.slug, ...params }, unstable_pattern: "", pattern: "" } as never;
}

type Answered = { data: { result?: { error?: Record<string, string[] | null>; initialValue?: Record<string, unknown> }; problems?: string[] }; init?: { status?: number } | null };

/** Status, messages by field and what was typed, of an action that did not redirect. */
export function answerOf(returned: unknown) {
  const { data, init } = returned as Answered;
  return { status: init?.status ?? 200, errors: data.result?.error ?? {}, typed: data.result?.initialValue ?? {}, problems: data.problems ?? [], data: data as Record<string, unknown> };
}
