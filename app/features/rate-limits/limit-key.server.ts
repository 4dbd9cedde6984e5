import { createHash } from "node:crypto";
import type { Passage } from "./consume.server.ts";

/** The name of a counter. Addresses of people and of networks are kept as a digest only. */
export function limitKey({ door, key }: Passage): string {
  return `${door}:${createHash("sha256").update(key).digest("base64url")}`;
}
