import { requireRange } from "../require-range.ts";

type Weighing = { massCt: number; sg: number; uAirCt: number; uWaterCt: number };

/** Above this a density tells hardly any two gem species apart (formulas.md §8.5, table). */
export const uselessDensityU = 0.1;

/**
 * Standard uncertainty that a hydrostatic density of a stone would have, before it is weighed.
 *
 *   u(SG) ≈ (R/m) √((R − 1)² u_a² + R² u_w²),   R = SG
 *
 * @throws RangeError
 *
 * Source: propagation by JCGM 100:2008, water taken as 1 g/cm³.
 */
export function expectedDensityU({ massCt, sg, uAirCt, uWaterCt }: Weighing): number {
  requireRange("massCt", massCt, massCt > 0);
  requireRange("sg", sg, sg > 1 && sg < 25);
  requireRange("uAirCt", uAirCt, uAirCt >= 0);
  requireRange("uWaterCt", uWaterCt, uWaterCt >= 0);
  return (sg / massCt) * Math.hypot((sg - 1) * uAirCt, sg * uWaterCt);
}
