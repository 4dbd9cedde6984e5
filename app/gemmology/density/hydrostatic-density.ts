import { requireRange } from "../require-range.ts";
import { waterDensityKgM3 } from "./water-density.ts";

/** Greatest density of water, at 4 °C, kg/m³: what specific gravity is relative to. */
const densestWaterKgM3 = 999.97495;

export type HydrostaticWeighing = Readonly<{
  /** Suspended: what the balance shows with the stone in water. Beaker on the pan, tared: what it shows when the stone hangs in it. */
  method: "suspended" | "beakerOnPan";
  /** ct, > 0 */
  massAirCt: number;
  /** ct; suspended: in [0, massAirCt); beaker on the pan: in (0, massAirCt] */
  massLiquidCt: number;
  /** °C of the water, in [0, 40] */
  tempC: number;
  /** kg/m³ of the air; 1.2 where it was not measured. */
  airDensityKgM3?: number;
  /** Standard uncertainties: ct, ct, K, kg/m³. */
  uMassAirCt?: number;
  uMassLiquidCt?: number;
  uTempC?: number;
  uAirDensityKgM3?: number;
}>;

/** kg/m³ that each source of error contributes to the density, signed: the uncertainty budget. */
export type DensityBudget = Readonly<{ massAir: number; massLiquid: number; water: number; air: number }>;
export type HydrostaticDensity = Readonly<{ densityKgM3: number; uDensityKgM3: number; sg: number; uSg: number; budget: DensityBudget }>;

/**
 * Density of a stone by weighing in air and in water, with the buoyancy of the air and its full uncertainty.
 *
 * Holds for a wetted, non-porous stone without closed voids; bubbles and pores make it read low, one-sidedly, and are not
 * in the uncertainty. Default uncertainties are those of a balance that shows 0.001 ct.
 *
 * @throws RangeError when an argument leaves its range
 *
 * Source: Archimedes' principle; ρ = (m_a ρ_w − m_w ρ_a)/(m_a − m_w). Water: Tanaka et al., Metrologia 38 (2001) 301.
 * Propagation by JCGM 100:2008, 5.1.2.
 * @example hydrostaticDensity({ method: "suspended", massAirCt: 5.216, massLiquidCt: 3.914, tempC: 21.5 }).sg // ≈ 3.994
 */
export function hydrostaticDensity({
  method,
  massAirCt,
  massLiquidCt,
  tempC,
  airDensityKgM3 = 1.2,
  uMassAirCt = 0.0015,
  uMassLiquidCt = 0.004,
  uTempC = 0.3,
  uAirDensityKgM3 = 0.02,
}: HydrostaticWeighing): HydrostaticDensity {
  requireRange("massAirCt", massAirCt, massAirCt > 0);
  if (method === "suspended") requireRange("massLiquidCt", massLiquidCt, massLiquidCt >= 0 && massLiquidCt < massAirCt);
  else requireRange("massLiquidCt", massLiquidCt, massLiquidCt > 0 && massLiquidCt <= massAirCt);
  requireRange("airDensityKgM3", airDensityKgM3, airDensityKgM3 >= 0 && airDensityKgM3 <= 2);
  for (const [name, value] of Object.entries({ uMassAirCt, uMassLiquidCt, uTempC, uAirDensityKgM3 })) requireRange(name, value, value >= 0);

  const water = waterDensityKgM3(tempC);
  const uWater = Math.abs(waterDensityKgM3(Math.min(40, tempC + 0.05)) - waterDensityKgM3(Math.max(0, tempC - 0.05))) * (uTempC / (Math.min(40, tempC + 0.05) - Math.max(0, tempC - 0.05)));
  // Both set-ups come down to the mass of the water that the stone displaces.
  const displacedCt = method === "suspended" ? massAirCt - massLiquidCt : massLiquidCt;
  const ratio = massAirCt / displacedCt;
  const densityKgM3 = airDensityKgM3 + (water - airDensityKgM3) * ratio;

  const perDisplaced = (-(water - airDensityKgM3) * massAirCt) / displacedCt ** 2;
  const perAir = (water - airDensityKgM3) / displacedCt + (method === "suspended" ? perDisplaced : 0);
  const perLiquid = method === "suspended" ? -perDisplaced : perDisplaced;
  const budget: DensityBudget = {
    massAir: perAir * uMassAirCt,
    massLiquid: perLiquid * uMassLiquidCt,
    water: ratio * uWater,
    air: (1 - ratio) * uAirDensityKgM3,
  };
  const uDensityKgM3 = Math.hypot(budget.massAir, budget.massLiquid, budget.water, budget.air);
  return { densityKgM3, uDensityKgM3, sg: densityKgM3 / densestWaterKgM3, uSg: uDensityKgM3 / densestWaterKgM3, budget };
}
