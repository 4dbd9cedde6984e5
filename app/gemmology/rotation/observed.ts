import type { EdgePair } from "./edge-indices.ts";
import { polariserUDeg, type RotationRun } from "./rotation-run.ts";
import { normalCdf } from "../statistics/normal-cdf.ts";
import { normalPdf } from "../statistics/normal-pdf.ts";

/** One position of one facet, as the fit needs it. */
export type Position = Readonly<{ facet: number; reading: number; angleDeg: number; upper: number | null; lower: number | null; u: number; polariserDeg: number | null }>;
export type Observed = Readonly<{ facetCount: number; positions: readonly Position[] }>;

export function observedOf({ facets }: RotationRun): Observed {
  return { facetCount: facets.length, positions: facets.flatMap(({ readings }, facet) => readings.map(({ angleDeg, upper, lower, u, polariserDeg }, reading) => ({ facet, reading, angleDeg, upper, lower, u, polariserDeg }))) };
}

/** Both edges read at one value: one edge was seen, and read once. */
export const isMerged = ({ upper, lower }: Pick<Position, "upper" | "lower">) => upper !== null && upper === lower;

/**
 * What was read at a position less what a crystal would show there, in standard uncertainties.
 *
 * Two edges that nearly touch cannot be told apart by their readings: of the two the larger is written down as the upper.
 * So there the readings' mean and their difference are compared, the difference with what a difference without sign would
 * be on average (a folded normal distribution).
 *
 * @param vibrationDeg of the upper edge; null where the crystal has none
 */
export function deviations({ upper, lower, u, polariserDeg }: Position, shown: EdgePair, vibrationDeg: number | null): number[] {
  const found = edgeDeviations(upper, lower, u, shown);
  if (polariserDeg !== null && vibrationDeg !== null) found.push(halfTurn(polariserDeg - vibrationDeg) / polariserUDeg);
  return found;
}

function edgeDeviations(upper: number | null, lower: number | null, u: number, shown: EdgePair): number[] {
  if (upper === null || lower === null) return upper !== null ? [(upper - shown.upper) / u] : lower !== null ? [(lower - shown.lower) / u] : [];
  const gap = shown.upper - shown.lower;
  if (upper === lower) return [(upper - (shown.upper + shown.lower) / 2) / u, -gap / (Math.SQRT2 * u)];
  if (gap > 6 * u) return [(upper - shown.upper) / u, (lower - shown.lower) / u];
  const uGap = Math.SQRT2 * u;
  const expected = 2 * uGap * normalPdf(gap / uGap) + gap * (1 - 2 * normalCdf(-gap / uGap));
  return [((upper + lower - shown.upper - shown.lower) / u) * Math.SQRT1_2, (upper - lower - expected) / uGap];
}

/** A difference of directions without arrow: −90° up to 90°. */
export function halfTurn(deg: number): number {
  const folded = ((deg % 180) + 180) % 180;
  return folded > 90 ? folded - 180 : folded;
}
