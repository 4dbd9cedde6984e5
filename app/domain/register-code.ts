const alphabet = "0123456789ABCDEFGHJKMNPQRSTVWXYZ";

/**
 * The code of a report in the public register: 15 random Crockford base-32 characters and one check character.
 * The check is a sum in the field of 32 elements, weighted by powers of its generator, so any single wrong
 * character and any swap of two characters is noticed before the register is asked.
 */
export type RegisterCode = string & { readonly __registerCode: true };

/** @param randomValues 15 integers in [0, 31] from a cryptographic source */
export function registerCodeFrom(randomValues: readonly number[]): RegisterCode {
  if (randomValues.length !== 15 || randomValues.some((v) => !Number.isInteger(v) || v < 0 || v > 31)) {
    throw new RangeError("a register code needs 15 values in [0, 31]");
  }
  const body = randomValues.map((v) => alphabet[v]).join("");
  return `${body}${checkCharacter(body)}` as RegisterCode;
}

/**
 * Reads a code as a person types it: any case, with or without dashes and spaces, O as 0, I and L as 1.
 * @returns undefined when it is not a well-formed code
 */
export function parseRegisterCode(text: string): RegisterCode | undefined {
  const compact = text.toUpperCase().replace(/[\s\u2010-\u2015-]/g, "").replace(/O/g, "0").replace(/[IL]/g, "1");
  if (!/^[0-9A-HJKMNP-TV-Z]{16}$/.test(compact)) return undefined;
  return compact[15] === checkCharacter(compact.slice(0, 15)) ? (compact as RegisterCode) : undefined;
}

/** "7KQ4-M2XD-9TPA-3HZW" */
export function formatRegisterCode(code: RegisterCode): string {
  return code.replace(/(.{4})(?=.)/g, "$1-");
}

/** Σ αⁱ⁺¹·vᵢ in GF(2⁵) with the primitive polynomial x⁵ + x² + 1; α has order 31, so the 15 weights differ. */
function checkCharacter(body: string): string {
  let sum = 0;
  for (let i = 0; i < body.length; i++) {
    let term = alphabet.indexOf(body[i]!);
    for (let power = 0; power <= i; power++) term = timesAlpha(term);
    sum ^= term;
  }
  return alphabet[sum]!;
}

function timesAlpha(value: number): number {
  const shifted = value << 1;
  return shifted & 0b100000 ? shifted ^ 0b100101 : shifted;
}
