import type { Id } from "./ids.ts";

const digits = "23456789abcdefghjkmnpqrstuvwxyz";
const base = BigInt(digits.length);
const hexId = /^[0-9a-f]{32}$/;

/** A row as it is named in an address, where it has no code or number of its own: opaque, short, safe to paste. */
export function shortRef(id: Id<string>): string {
  let rest = BigInt(`0x${id.replaceAll("-", "")}`);
  let text = "";
  while (rest > 0n) {
    text = digits[Number(rest % base)] + text;
    rest /= base;
  }
  return text.padStart(26, digits[0]);
}

/** @returns undefined when the text is no reference; says nothing about whether such a row exists */
export function idFromShortRef<Noun extends string>(ref: string): Id<Noun> | undefined {
  if (ref.length !== 26) return undefined;
  let value = 0n;
  for (const character of ref) {
    const digit = digits.indexOf(character);
    if (digit < 0) return undefined;
    value = value * base + BigInt(digit);
  }
  const hex = value.toString(16).padStart(32, "0");
  if (!hexId.test(hex)) return undefined;
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20)}` as Id<Noun>;
}
