import { randomBytes } from "node:crypto";
import helmet from "helmet";

const twoYearsSeconds = 63_072_000;

/**
 * @param isSecure people reach us by https
 * @param uploadOrigins where a browser may send files
 * @param payOrigin where a form of ours may lead to pay
 */
export function securityHeaders({ isSecure, uploadOrigins, payOrigin }) {
  const others = helmet({
    contentSecurityPolicy: false, // below: it has a nonce a response, and a page may have its own
    crossOriginEmbedderPolicy: false,
    frameguard: false, // below, for the same reason
    // The default, no-referrer, makes a browser send "Origin: null" with every form post without script.
    referrerPolicy: { policy: "same-origin" },
    strictTransportSecurity: isSecure ? { maxAge: twoYearsSeconds, includeSubDomains: true } : false,
  });
  const permissions = "camera=(self), serial=(self), microphone=(), geolocation=(), payment=(), usb=(), hid=(), midi=(), display-capture=(), browsing-topics=()";
  const policyFor = (nonce) =>
    [
      "default-src 'none'",
      `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'`,
      "style-src 'self'",
      "style-src-attr 'unsafe-inline'", // bars and charts set lengths in style attributes; no sheet can be injected
      "img-src 'self' data: blob:",
      "font-src 'self'",
      `connect-src ${["'self'", ...uploadOrigins].join(" ")}`,
      "manifest-src 'self'",
      "media-src 'self' blob:",
      "frame-src 'self'", // a report's draft, shown within its page
      "worker-src 'self'",
      `form-action 'self' ${payOrigin}`,
      "frame-ancestors 'none'",
      "base-uri 'none'",
      "object-src 'none'",
      ...(isSecure ? ["upgrade-insecure-requests"] : []), // would turn a local http address into https
    ].join("; ");

  return (request, response, next) => {
    const nonce = randomBytes(18).toString("base64");
    response.locals.nonce = nonce;
    response.setHeader("Permissions-Policy", permissions);
    // Only when the answer is complete is it known whether the page brought a policy of its own.
    const writeHead = response.writeHead;
    response.writeHead = function (...args) {
      if (!response.hasHeader("Content-Security-Policy")) response.setHeader("Content-Security-Policy", policyFor(nonce));
      if (!response.hasHeader("X-Frame-Options")) response.setHeader("X-Frame-Options", "DENY");
      if (!response.hasHeader("Cache-Control")) response.setHeader("Cache-Control", request.headers.cookie ? "private, no-store" : "no-cache");
      return writeHead.apply(this, args);
    };
    others(request, response, next);
  };
}

/** UploadThing's hosts, exactly: the stand-in's, or those of the regions that the token names. */
export function uploadOriginsFrom({ UPLOADTHING_INGEST_URL, UPLOADTHING_TOKEN }) {
  if (UPLOADTHING_INGEST_URL) return [new URL(UPLOADTHING_INGEST_URL).origin];
  if (!UPLOADTHING_TOKEN) return [];
  const { regions = [], ingestHost = "ingest.uploadthing.com" } = JSON.parse(Buffer.from(UPLOADTHING_TOKEN, "base64").toString("utf8"));
  return regions.map((region) => `https://${region}.${ingestHost}`);
}
