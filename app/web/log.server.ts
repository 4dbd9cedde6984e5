import pino from "pino";
import { isRouteErrorResponse } from "react-router";

const log = pino({ level: process.env.LOG_LEVEL ?? "info", base: null, timestamp: pino.stdTimeFunctions.isoTime });

/** Bugs only: what we planned for (a 4xx) is an answer, not an incident. Paths without their query: those hold tokens. */
export function logError(error: unknown, request?: Request): void {
  if (isRouteErrorResponse(error) && error.status < 500) return;
  const path = request ? new URL(request.url).pathname : undefined;
  log.error({ err: error instanceof Error ? error : new Error(String(error)), method: request?.method, path }, "unexpected error");
}

export { log };
