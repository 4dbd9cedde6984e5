import { randomUUID } from "node:crypto";
import { redactPath } from "./redact-path.mjs";

/** One line an answer: what was asked, by whom, how it ended. No query, no token, no body. */
export function accessLog(log) {
  return (request, response, next) => {
    const startedAt = performance.now();
    const requestId = randomUUID();
    response.locals.requestId = requestId;
    response.setHeader("X-Request-Id", requestId);
    const { method, originalUrl } = request;
    const address = request.ip; // gone once the connection is
    response.once("close", () => {
      log.info({
        requestId,
        method,
        path: redactPath(originalUrl),
        status: response.statusCode,
        ms: Math.round(performance.now() - startedAt),
        address,
        ...(!response.writableFinished && { isCutShort: true }),
      });
    });
    next();
  };
}
