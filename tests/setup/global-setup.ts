import type { TestProject } from "vitest/node";
import { startThrowAwayDb } from "./throw-away-db.ts";

declare module "vitest" {
  interface ProvidedContext {
    /** Of the whole run's server; each worker makes a database of its own there. */
    serverUrl: string;
  }
}

/** One MariaDB for the whole run. */
export default async function setup(project: TestProject) {
  const server = await startThrowAwayDb();
  project.provide("serverUrl", server.urlOf("isogyre"));
  return server.close;
}
