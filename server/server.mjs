// The production server: headers, limits, log and a graceful stop in front of the React Router build.
import http from "node:http";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { createRequestHandler } from "@react-router/express";
import compression from "compression";
import express from "express";
import pino from "pino";
import { RouterContextProvider } from "react-router";
import { accessLog } from "./access-log.mjs";
import { bodyLimit } from "./body-limit.mjs";
import { securityHeaders, uploadOriginsFrom } from "./security-headers.mjs";
import { stopGracefully } from "./stop-gracefully.mjs";

const root = fileURLToPath(new URL("..", import.meta.url));
process.chdir(root);
const { PORT = "3000", HOST = "127.0.0.1", PUBLIC_ORIGIN = `http://127.0.0.1:${PORT}`, TRUST_PROXY = "loopback", LOG_LEVEL = "info", STRIPE_API_URL } = process.env;
const log = pino({ level: LOG_LEVEL, base: null, timestamp: pino.stdTimeFunctions.isoTime });

const build = await import("../build/server/index.js");
// The very objects of the build: a second copy of a context would be another context.
const { nonceContext, clientAddressContext } = build.entry.module;

const app = express();
app.disable("x-powered-by");
app.set("trust proxy", /^\d+$/.test(TRUST_PROXY) ? Number(TRUST_PROXY) : TRUST_PROXY);
app.use(
  securityHeaders({
    isSecure: PUBLIC_ORIGIN.startsWith("https:"),
    uploadOrigins: uploadOriginsFrom(process.env),
    payOrigin: STRIPE_API_URL ? new URL(STRIPE_API_URL).origin : "https://checkout.stripe.com",
  }),
);
app.use(compression());
const clientFolder = path.join(root, "build", "client");
app.use("/assets", express.static(path.join(clientFolder, "assets"), { immutable: true, maxAge: "1y", fallthrough: false }));
app.use(express.static(clientFolder, { maxAge: "1h", index: false }));
app.use(accessLog(log));
app.use((_request, response, next) => {
  if (stopping.isStopping()) response.setHeader("Connection", "close");
  next();
});
app.use(bodyLimit);
app.use(
  createRequestHandler({
    build,
    mode: process.env.NODE_ENV,
    getLoadContext: (request, response) => {
      const context = new RouterContextProvider();
      context.set(nonceContext, response.locals.nonce);
      if (clientAddressContext) context.set(clientAddressContext, request.ip ?? "unknown");
      return context;
    },
  }),
);
app.use((error, request, response, next) => {
  const isAsked = error.code === "ERR_INVALID_URL" || (error.status >= 400 && error.status < 500);
  if (!isAsked && !request.destroyed) log.error({ err: error, requestId: response.locals.requestId }, "unexpected error");
  if (response.headersSent) return next(error); // which cuts the connection
  const status = isAsked ? (error.status ?? 400) : 500;
  response.status(status).type("text/plain").send(status === 404 ? "There is nothing at this address.\n" : status < 500 ? "This request cannot be understood.\n" : "The fault is ours and has been logged.\n");
});

const server = http.createServer(
  {
    headersTimeout: 15_000,
    requestTimeout: 120_000, // a picture over a slow line
    keepAliveTimeout: 10_000,
    connectionsCheckingInterval: 5_000,
  },
  app,
);
server.setTimeout(120_000); // a reader that stopped reading
const stopping = stopGracefully({ server, log });
server.once("error", (error) => {
  const reason = error.code === "EADDRINUSE" ? `port ${PORT} is in use by another program; set PORT to another one` : error.message;
  console.error(`The server cannot start: ${reason}`);
  process.exit(1);
});
server.listen(Number(PORT), HOST, () => {
  log.info({ origin: PUBLIC_ORIGIN, host: HOST, port: Number(PORT) }, "listening");
  process.send?.({ isListening: true });
});
