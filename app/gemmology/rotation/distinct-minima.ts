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

/** The same indices within a quarter of what is uncertain about them. */
function isSame(one: Refined, other: Refined): boolean {
  const [a, b] = [inOrder(one.crystal), inOrder(other.crystal)];
  const near = Math.max(3e-5, 0.25 * Math.min(leastU(one), leastU(other)));
  return a.every((value, at) => Math.abs(value - b[at]!) < near);
}

const leastU = ({ covariance }: Refined) => Math.sqrt(Math.max(0, Math.min(...covariance.map((row, at) => row[at]!))));
