import { decimalPlaces, parseDecimal } from "#app/domain/decimal.ts";
import type { MountState } from "#app/domain/take-in.ts";

export const mostItems = 20;
/** More stones than this in one item would be one label and one weight for too many things; a strand is one piece. */
export const mostStones = 100;
export const mostBeads = 5_000;
/** In minor units: ten thousand million, far above any safe. */
export const largestDeclared = 1_000_000_000_000;
const largestMass = { ct: 500_000, g: 100_000 } as const;

/** What is wrong with a count, as a sentence; undefined where nothing is. */
export function stoneCountProblem({ stoneCount, mount }: { stoneCount: number; mount: MountState }): string | undefined {
  const most = mount === "strung" ? mostBeads : mostStones;
  if (!Number.isInteger(stoneCount) || stoneCount < 1) return "There is at least one stone.";
  if (stoneCount > most) return mount === "strung" ? `At most ${most} in a strand.` : `At most ${most} stones an item: divide the parcel.`;
  return undefined;
}

export const notAMass = "Write the weight as the balance shows it, for example 4.182.";

/** What is wrong with a weight as typed, as a sentence; undefined where nothing is. */
export function massProblem({ massText, massUnit }: { massText: string; massUnit: "ct" | "g" }): string | undefined {
  const value = parseDecimal(massText);
  if (value === undefined) return notAMass;
  if (value <= 0) return "The weight is more than zero.";
  if (decimalPlaces(massText) > 4) return "At most four decimals.";
  if (value > largestMass[massUnit]) return `At most ${largestMass[massUnit]} ${massUnit}: is the unit right?`;
  return undefined;
}
