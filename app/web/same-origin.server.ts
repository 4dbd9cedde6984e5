import { data } from "react-router";

const safeMethods = new Set(["GET", "HEAD", "OPTIONS"]);
/** Called by other servers with signatures of their own, or by bearers of a token, never with a cookie. */
const signedCallers = ["/webhooks/", "/api/uploadthing", "/api/v1/"];

/** Refuses a write that another site's page started: by Sec-Fetch-Site where the browser tells, else by Origin. */
export function requireSameOrigin(request: Request, publicOrigin: string): void {
  if (safeMethods.has(request.method)) return;
  const { pathname } = new URL(request.url);
  if (signedCallers.some((prefix) => pathname.startsWith(prefix))) return;
  const site = request.headers.get("sec-fetch-site");
  const origin = request.headers.get("origin");
  const isOurs = site ? site === "same-origin" || site === "none" : origin === null || origin === publicOrigin || origin === new URL(request.url).origin;
  if (!isOurs) throw data({ userMessage: "This form was sent from another site, so nothing was done. Open the page here and try again." }, { status: 403 });
}
