import type { TestProject } from "vitest/node";
import { startAppServer } from "./app-server.ts";

declare module "vitest" {
  interface ProvidedContext {
    /** Where the journeys find the product and its stand-ins. */
    journey: { url: string; databaseUrl: string; queryLog: string; mailboxUrl: string; stripeUrl: string; uploadsUrl: string };
  }
}

/** One server for all journeys, with the demonstration laboratory loaded. */
export default async function setup(project: TestProject) {
  const app = await startAppServer();
  project.provide("journey", { url: app.url, databaseUrl: app.databaseUrl, queryLog: app.queryLog, mailboxUrl: app.mailbox.url, stripeUrl: app.stripe.url, uploadsUrl: app.uploads.url });
  return app.close;
}
