import { requireRange } from "../require-range.ts";
import type { HydrostaticDensity } from "./hydrostatic-density.ts";

/** A specific gravity less certain than this no longer parts most gem materials (project's formulas, §8.5 and §11). */
const uselessUSg = 0.05;
/** What a weighing is expected to reach. */
const wishedUSg = 0.02;

/**
 * Says when a stone is too small, or too dense, for the balance that weighed it. The uncertainty rises as 1/mass and as
 * the square of the specific gravity, so that no care makes up for it.
 *
 * @param massAirCt the stone in air, ct, > 0
 * @param result of the same weighing
 * @returns words for the gemmologist, with the mass that would do on this balance; null where the weighing is worth its trouble
 * @throws RangeError when the mass leaves its range
 *
 * Source: u(ρ) ≈ (ρ_w R/m)·√((R − 1)² u_a² + R² u_w²), R = ρ/ρ_w, by JCGM 100:2008, 5.1.2.
 */
export function weighingWarning({ massAirCt, result }: { massAirCt: number; result: HydrostaticDensity }): string | null {
  requireRange("massAirCt", massAirCt, massAirCt > 0);
  const { sg, uSg } = result;
  if (uSg <= uselessUSg) return null;
  const neededCt = (massAirCt * uSg) / wishedUSg;
  const range = `${Math.max(0, sg - 2 * uSg).toFixed(2)}–${(sg + 2 * uSg).toFixed(2)}`;
  return `Too small for this balance: the specific gravity may be anything in ${range}. For ±${wishedUSg.toFixed(2)} a stone like this would have to weigh about ${neededCt < 10 ? neededCt.toFixed(1) : Math.round(neededCt)} ct.`;
}
