import Stripe from "stripe";

/** The real SDK; `apiUrl` names a stand-in for development and tests. */
export function createStripe({ secretKey, apiUrl }: { secretKey: string; apiUrl?: string }): Stripe {
  const url = apiUrl ? new URL(apiUrl) : null;
  return new Stripe(secretKey, {
    ...(url && {
      host: url.hostname,
      port: Number(url.port || (url.protocol === "https:" ? 443 : 80)),
      protocol: url.protocol === "https:" ? "https" : "http",
    }),
    maxNetworkRetries: 2,
    timeout: 10_000,
    telemetry: false,
  });
}
