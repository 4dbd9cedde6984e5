import { createHash, randomBytes } from "node:crypto";

/** 256 random bits for a cookie or a link; 43 characters. */
export function newToken(): string {
  return randomBytes(32).toString("base64url");
}

/** The only form in which a token is kept. */
export function hashToken(token: string): Buffer {
  return createHash("sha256").update(token).digest();
}
