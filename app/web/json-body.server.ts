import { problem } from "./problem.server.ts";
import { readTextUpTo } from "./read-text-up-to.server.ts";

const mostBytes = 256 * 1024;

/** The JSON of a request to the interface, or the problem to answer with. */
export async function jsonBody(request: Request): Promise<{ value: unknown } | { response: Response }> {
  if (request.method !== "POST") {
    const response = problem({ status: 405, title: "Method not allowed", detail: "Send the evidence by POST." });
    response.headers.set("Allow", "POST");
    return { response };
  }
  const type = request.headers.get("content-type") ?? "";
  if (!/^application\/(.+\+)?json\b/i.test(type)) {
    return { response: problem({ status: 415, title: "Unsupported media type", detail: "Send application/json." }) };
  }
  const text = await readTextUpTo(request, mostBytes);
  if (text === undefined) return { response: problem({ status: 413, title: "Content too large", detail: "At most 256 KiB are read." }) };
  try {
    return { value: JSON.parse(text) as unknown };
  } catch {
    return { response: problem({ status: 400, title: "Not JSON", detail: "The body could not be read as JSON." }) };
  }
}
