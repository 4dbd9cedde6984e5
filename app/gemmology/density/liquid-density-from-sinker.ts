import { requireRange } from "../require-range.ts";

/**
 * Density of a liquid by weighing a sinker of known density in it: how a heavy or an immersion liquid is checked.
 *
 * @param massAirCt the sinker in air, ct, > 0
 * @param massLiquidCt the sinker in the liquid, ct, in [0, massAirCt)
 * @param sinkerDensityKgM3 kg/m³, > 0; a quartz crystal has 2649
 * @param airDensityKgM3 kg/m³, in [0, 2]
 * @returns kg/m³, unrounded
 * @throws RangeError when an argument leaves its range
 *
 * Source: Archimedes' principle, with the buoyancy of the air.
 * @example liquidDensityFromSinker({ massAirCt: 10, massLiquidCt: 6.228, sinkerDensityKgM3: 2649 }) // ≈ 1000
 */
export function liquidDensityFromSinker({ massAirCt, massLiquidCt, sinkerDensityKgM3, airDensityKgM3 = 1.2 }: { massAirCt: number; massLiquidCt: number; sinkerDensityKgM3: number; airDensityKgM3?: number }): number {
  requireRange("massAirCt", massAirCt, massAirCt > 0);
  requireRange("massLiquidCt", massLiquidCt, massLiquidCt >= 0 && massLiquidCt < massAirCt);
  requireRange("sinkerDensityKgM3", sinkerDensityKgM3, sinkerDensityKgM3 > 0);
  requireRange("airDensityKgM3", airDensityKgM3, airDensityKgM3 >= 0 && airDensityKgM3 <= 2);
  return airDensityKgM3 + ((sinkerDensityKgM3 - airDensityKgM3) * (massAirCt - massLiquidCt)) / massAirCt;
}
