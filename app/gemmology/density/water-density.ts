import { requireRange } from "../require-range.ts";

/**
 * Density of air-free water at 101.325 kPa.
 *
 * @param tempC temperature, °C (ITS-90), in [0, 40]
 * @returns kg/m³; standard uncertainty about 0.001
 * @throws RangeError when the temperature leaves its range
 *
 * Source: Tanaka, Girard, Davis, Peuto, Bignell, Metrologia 38 (2001) 301–309.
 * @example waterDensityKgM3(20) // ≈ 998.2067
 */
export function waterDensityKgM3(tempC: number): number {
  requireRange("tempC", tempC, tempC >= 0 && tempC <= 40);
  return 999.97495 * (1 - ((tempC - 3.983035) ** 2 * (tempC + 301.797)) / (522528.9 * (tempC + 69.34881)));
}
