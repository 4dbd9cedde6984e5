import { inOrder } from "./crystal-model.ts";
import type { Refined } from "./refine.ts";

/** A minimum that is worse by so much is not kept beside a better one. */
const hopeless = 100;

/** Minima apart in their indices, the deepest first; of two that are the same, the deeper. */
export function distinctMinima<Minimum extends Refined>(found: readonly Minimum[]): Minimum[] {
  const kept: Minimum[] = [];
  for (const each of [...found].sort((a, b) => a.chiSquared - b.chiSquared)) {
    if (kept[0] && each.chiSquared > kept[0].chiSquared + hopeless) break;
    if (!kept.some((other) => isSame(each, other))) kept.push(each);
  }
  return kept;
}

/** The same kind of crystal, with the same indices within half of what is uncertain about each. */
function isSame(one: Refined, other: Refined): boolean {
  if (one.crystal.rank !== other.crystal.rank) return false;
  const [a, b] = [inOrder(one.crystal), inOrder(other.crystal)];
  const [ua, ub] = [usInOrder(one), usInOrder(other)];
  return a.every((value, at) => Math.abs(value - b[at]!) < Math.max(3e-5, 0.5 * Math.min(ua[at]!, ub[at]!)));
}

function usInOrder({ crystal, covariance }: Refined): number[] {
  const own = covariance.map((row, at) => ({ value: crystal.free[at]!, u: Math.sqrt(Math.max(0, row[at]!)) })).sort((a, b) => a.value - b.value);
  const us = own.map(({ u }) => u);
  // Of the two indices that a uniaxial crystal has, the ordinary counts twice.
  return crystal.rank === 2 ? (crystal.free[0]! < crystal.free[1]! ? [us[0]!, us[0]!, us[1]!] : [us[0]!, us[1]!, us[1]!]) : crystal.rank === 1 ? [us[0]!, us[0]!, us[0]!] : us;
}
