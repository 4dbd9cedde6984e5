import { solve } from "../linear/solve.ts";
import { crystalsOf, type Start } from "./section-harmonics.ts";

type Pair = Readonly<{ angleDeg: number; upper: number; lower: number }>;

/**
 * The crystals, at most two, whose sections give the edges of one facet, by linear least squares on the harmonics of
 * their sum and product.
 *
 * @param pairs positions at which both edges were read; at least three of them apart within a half turn
 * @returns no start where the positions do not suffice
 */
export function algebraicStart(pairs: readonly Pair[]): Start[] {
  const apart = new Set(pairs.map(({ angleDeg }) => Math.round((((angleDeg % 180) + 180) % 180) * 10)));
  if (apart.size < 3) return [];
  const middle = pairs.reduce((sum, { upper, lower }) => sum + upper ** -2 + lower ** -2, 0) / (2 * pairs.length);
  return crystalsOf({
    power: -2,
    middle,
    s: harmonics(pairs, ({ upper, lower }) => upper ** -2 - middle + (lower ** -2 - middle)),
    p: harmonics(pairs, ({ upper, lower }) => (upper ** -2 - middle) * (lower ** -2 - middle)),
  });
}

/** Least squares on 1, cos 2φ, sin 2φ. */
function harmonics(pairs: readonly Pair[], of: (pair: Pair) => number): [number, number, number] {
  const normal = Array.from({ length: 3 }, () => [0, 0, 0]);
  const right = [0, 0, 0];
  for (const pair of pairs) {
    const twice = (2 * pair.angleDeg * Math.PI) / 180;
    const row = [1, Math.cos(twice), Math.sin(twice)];
    const value = of(pair);
    for (let i = 0; i < 3; i++) {
      right[i]! += row[i]! * value;
      for (let j = 0; j < 3; j++) normal[i]![j]! += row[i]! * row[j]!;
    }
  }
  return solve(normal, right) as [number, number, number];
}
