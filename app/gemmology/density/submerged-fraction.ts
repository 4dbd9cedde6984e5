import { requireRange } from "../require-range.ts";

/**
 * Share of a floating body's volume that is under the surface, as a hydrometer uses it.
 *
 * @param bodyDensityKgM3, liquidDensityKgM3 kg/m³, > 0
 * @returns 0 to 1; null where the body sinks
 * @throws RangeError when an argument leaves its range
 *
 * Source: Archimedes' principle; the air's buoyancy is neglected.
 * @example submergedFraction({ bodyDensityKgM3: 1080, liquidDensityKgM3: 1190 }) // ≈ 0.908, amber in brine
 */
export function submergedFraction({ bodyDensityKgM3, liquidDensityKgM3 }: { bodyDensityKgM3: number; liquidDensityKgM3: number }): number | null {
  requireRange("bodyDensityKgM3", bodyDensityKgM3, bodyDensityKgM3 > 0);
  requireRange("liquidDensityKgM3", liquidDensityKgM3, liquidDensityKgM3 > 0);
  return bodyDensityKgM3 > liquidDensityKgM3 ? null : bodyDensityKgM3 / liquidDensityKgM3;
}
