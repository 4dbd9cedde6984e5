import { createHmac, timingSafeEqual } from "node:crypto";

/** UploadThing signs everything alike: bodies of callbacks and URLs. */
export function signText(text: string, apiKey: string): string {
  return `hmac-sha256=${createHmac("sha256", apiKey).update(text).digest("hex")}`;
}

/** The signature covers the whole URL, origin included, up to its own parameter, which is always the last. */
export function isUrlSigned(fullUrl: string, apiKey: string): boolean {
  const at = fullUrl.lastIndexOf("signature=");
  if (at < 1) return false;
  const { searchParams } = new URL(fullUrl);
  const given = Buffer.from(searchParams.get("signature") ?? "");
  const expected = Buffer.from(signText(fullUrl.slice(0, at - 1), apiKey));
  return given.length === expected.length && timingSafeEqual(given, expected) && Number(searchParams.get("expires")) > Date.now();
}

export function signUrl(url: URL, apiKey: string): string {
  url.searchParams.append("signature", signText(url.toString(), apiKey));
  return url.href;
}

/** The value of UPLOADTHING_TOKEN. */
export function makeToken({ apiKey, appId }: { apiKey: string; appId: string }): string {
  return Buffer.from(JSON.stringify({ apiKey, appId, regions: ["local"] })).toString("base64");
}
