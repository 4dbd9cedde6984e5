import { spawn, type ChildProcess } from "node:child_process";
import { randomBytes } from "node:crypto";
import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { startFakeMailbox } from "#fakes/mailbox/server.ts";
import { startFakeStripe } from "#fakes/stripe/server.ts";
import { startFakeUploadThing } from "#fakes/uploadthing/server.ts";
import { buildIfChanged } from "../../scripts/build.mjs";
import { createCrew } from "../../scripts/crew.mjs";
import { runMigrations } from "../../scripts/migrate.mjs";
import { freePort } from "./free-port.ts";
import { startThrowAwayDb } from "./throw-away-db.ts";

export type AppServer = Awaited<ReturnType<typeof startAppServer>>;

/**
 * The product as people meet it: the build behind its own server, a database and stand-ins of its own, on free ports.
 *
 * @param isDemo loads the species table and the demonstration laboratory
 */
export async function startAppServer({ isDemo = true, env = {} }: { isDemo?: boolean; env?: Record<string, string> } = {}) {
  await buildIfChanged(createCrew());
  const started: (() => Promise<void>)[] = [];
  const close = async () => {
    for (const end of started.splice(0).reverse()) await end();
  };
  try {
    return await startAll({ isDemo, env, started, close });
  } catch (error) {
    await close();
    throw error;
  }
}

type Starting = { isDemo: boolean; env: Record<string, string>; started: (() => Promise<void>)[]; close: () => Promise<void> };

async function startAll({ isDemo, env, started, close }: Starting) {
  const keep = <T extends { close: () => Promise<void> }>(service: T): T => {
    started.push(service.close);
    return service;
  };
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const db = keep(await startThrowAwayDb({ hasQueryLog: true }));
  const databaseUrl = db.urlOf("isogyre");
  await runMigrations(databaseUrl);
  const stripe = keep(await startFakeStripe({ webhookUrl: `${url}/webhooks/stripe` }));
  const uploads = keep(await startFakeUploadThing());
  const mailbox = keep(await startFakeMailbox());

  const settings: NodeJS.ProcessEnv = {
    ...process.env,
    NODE_ENV: "production",
    HOST: "127.0.0.1",
    PORT: String(port),
    PUBLIC_ORIGIN: url,
    DATABASE_URL: databaseUrl,
    SESSION_SECRET: randomBytes(32).toString("hex"),
    STRIPE_API_URL: stripe.url,
    STRIPE_SECRET_KEY: stripe.secretKey,
    STRIPE_WEBHOOK_SECRET: stripe.webhookSecret,
    UPLOADTHING_TOKEN: uploads.token,
    UPLOADTHING_API_URL: uploads.url,
    UPLOADTHING_INGEST_URL: uploads.url,
    UPLOADTHING_FILE_URL: uploads.url,
    UPLOADTHING_CALLBACK_URL: `${url}/api/uploadthing`,
    UPLOADTHING_IS_DEV: "false",
    SMTP_URL: mailbox.smtpUrl,
    ISOGYRE_DEMO: isDemo ? "1" : "0",
    ...env,
  };
  // Vitest's own marks would make the product believe that it is being tested.
  for (const name of ["VITEST", "VITEST_MODE", "TEST"]) delete settings[name];
  for (const script of ["scripts/load-species.ts", ...(isDemo ? ["scripts/seed.ts"] : [])]) if (fs.existsSync(script)) await run(["--import", "tsx", script], settings);

  const logFile = path.join(os.tmpdir(), `isogyre-test-server-${port}.log`);
  const log = fs.openSync(logFile, "w");
  const server = spawn(process.execPath, ["server/server.mjs"], { stdio: ["ignore", log, log, "ipc"], env: settings });
  fs.closeSync(log);
  started.push(async () => {
    await end(server);
    fs.rmSync(logFile, { force: true });
  });
  await untilListening(server, logFile);

  return {
    url,
    databaseUrl,
    queryLog: db.queryLog,
    stripe,
    uploads,
    mailbox,
    /** What the server logged so far. */
    readLog: () => fs.readFileSync(logFile, "utf8"),
    close,
    [Symbol.asyncDispose]: close,
  };
}

function run(args: string[], env: NodeJS.ProcessEnv): Promise<void> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, args, { stdio: ["ignore", "ignore", "pipe"], env });
    let said = "";
    child.stderr.setEncoding("utf8").on("data", (text: string) => (said += text));
    child.once("error", reject);
    child.once("close", (code, signal) => (code === 0 ? resolve() : reject(new Error(`${args.join(" ")} ended with ${code ?? signal}:\n${said.slice(-4_000)}`))));
  });
}

function untilListening(server: ChildProcess, logFile: string): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once("message", () => resolve());
    server.once("exit", (code, signal) => reject(new Error(`the server ended with ${code ?? signal}:\n${fs.readFileSync(logFile, "utf8").slice(-4_000)}`)));
  });
}

async function end(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const ended = new Promise((resolve) => child.once("exit", resolve));
  child.kill("SIGTERM");
  await ended;
}
