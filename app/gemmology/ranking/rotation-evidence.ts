import type { RotationFit, RotationSolution } from "../rotation/rotation-fit.ts";
import { defaultU, sharedOffset } from "./defaults.ts";
import type { RefractiveEvidence, RotationCrystal } from "./evidence.ts";

/**
 * What a rotation run says to the ranking: every crystal that it allows, weighted by how well it fits, so that both count
 * where one facet cannot. A run that showed only one edge gives that edge as a single reading. None where nothing was
 * fitted.
 *
 * The fit's uncertainties are those of scatter; the instrument's own error, which all readings share, is added.
 *
 * Source: likelihood ratio exp(−Δχ²/2) between solutions of one run.
 */
export function rotationEvidence({ solutions }: Pick<RotationFit, "solutions">): RefractiveEvidence | null {
  const crystals = solutions.flatMap((solution): RotationCrystal[] => {
    const { indices } = solution;
    if (!("n" in indices || "omega" in indices || "beta" in indices)) return [];
    return [{ indices, u: uOf(solution), weight: Math.max(1e-6, Math.exp(-solution.deltaChiSquared / 2)) }];
  });
  if (crystals.length > 0) return { kind: "rotation", solutions: crystals };
  const only = solutions[0];
  const edge = only && Object.values(only.indices)[0];
  return only && edge !== undefined ? { kind: "single", n: edge, u: uOf(only) } : null;
}

function uOf({ u }: RotationSolution): number {
  const values = Object.values(u).filter((each) => Number.isFinite(each) && each > 0);
  return Math.min(0.5, Math.hypot(values.length > 0 ? Math.max(...values) : defaultU.edge, sharedOffset));
}
