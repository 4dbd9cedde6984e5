import type { RouterContextProvider } from "react-router";
import { AppError } from "#app/domain/app-error.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { appContext } from "./contexts.server.ts";
import { jsonBody } from "./json-body.server.ts";
import { problem } from "./problem.server.ts";

/** Every call of the interface over HTTP comes through here: counted, read as JSON of a bounded size, refused as a problem. */
export async function apiDoor({ request, context }: { request: Request; context: Readonly<RouterContextProvider> }, answer: (value: unknown) => Response): Promise<Response> {
  const app = context.get(appContext);
  try {
    await consume(app, { door: "api", key: app.clientAddress });
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    const response = problem({ status: error.status, title: "Too many requests", detail: error.userMessage });
    if (error.retryAfterS !== null) response.headers.set("Retry-After", String(error.retryAfterS));
    return response;
  }
  const body = await jsonBody(request);
  return "response" in body ? body.response : answer(body.value);
}
