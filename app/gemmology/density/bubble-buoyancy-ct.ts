import { requireRange } from "../require-range.ts";
import { waterDensityKgM3 } from "./water-density.ts";

/**
 * What a bubble on a stone under water takes off its reading: the specific gravity then reads low, one-sidedly.
 *
 * @param diameterMm of the bubble, mm, ≥ 0
 * @param tempC °C of the water, in [0, 40]
 * @returns ct, unrounded
 * @throws RangeError when an argument leaves its range
 *
 * Source: Archimedes' principle; the bubble's own mass is neglected.
 * @example bubbleBuoyancyCt({ diameterMm: 1, tempC: 20 }) // ≈ 0.0026
 */
export function bubbleBuoyancyCt({ diameterMm, tempC }: { diameterMm: number; tempC: number }): number {
  requireRange("diameterMm", diameterMm, diameterMm >= 0);
  const volumeMm3 = (Math.PI / 6) * diameterMm ** 3;
  return (volumeMm3 * waterDensityKgM3(tempC)) / 1000 / 200;
}
