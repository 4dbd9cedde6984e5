import type { SpeciesRow } from "./species-row.ts";
import type { Interval } from "./species-table.ts";

/**
 * Where β stands between α and γ of a form, 0 at α, 1 at γ: (β − α)/(γ − α) ≈ sin² V_z for the birefringences of gems.
 * Uniaxial crystals have it at an end, biaxial ones where their optic angle puts it.
 *
 * @returns null for isotropic forms and aggregates
 *
 * Source: tan² V_z = (1/α² − 1/β²)/(1/β² − 1/γ²), to first order in the birefringence.
 */
export function betaShareOf({ optic_character: character, optic_sign: sign, two_v: twoV }: Pick<SpeciesRow, "optic_character" | "optic_sign" | "two_v">): Interval | null {
  const characters = typeof character === "string" ? [character] : character;
  if (characters.includes("biaxial")) {
    if (!twoV) return [0, 1];
    // 2V is the acute angle about Z in positive crystals, about X in negative ones; above 90° the sign has changed.
    const [least, most] = sign === "-" ? [180 - twoV.max, 180 - twoV.min] : sign === "±" ? [twoV.min, 180 - twoV.min] : [twoV.min, twoV.max];
    const share = (twoVzDeg: number) => Math.sin((twoVzDeg * Math.PI) / 360) ** 2;
    return [share(Math.min(least, most)), share(Math.max(least, most))];
  }
  if (!characters.includes("uniaxial")) return null;
  return sign === "+" ? [0, 0] : sign === "-" ? [1, 1] : [0, 1];
}
