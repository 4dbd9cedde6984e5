import { randomInt } from "node:crypto";
import { registerCodeFrom, type RegisterCode } from "#app/domain/register-code.ts";

/** 75 random bits and a check character; unrelated to any number or id. */
export function newRegisterCode(): RegisterCode {
  return registerCodeFrom(Array.from({ length: 15 }, () => randomInt(32)));
}
