import type { MiddlewareFunction } from "react-router";

/** Pages with secrets in their address or their forms are kept by nobody on the way. */
export const privateMiddleware: MiddlewareFunction<Response> = async (_args, next) => {
  const response = await next();
  if (!response.headers.has("Cache-Control")) response.headers.set("Cache-Control", "private, no-store");
  return response;
};
