import { requireRange } from "../require-range.ts";

/**
 * Density of moist air.
 *
 * @param tempC °C, in [5, 40]
 * @param pressureHPa in [600, 1100]
 * @param humidityPercent relative humidity, in [0, 100]
 * @returns kg/m³
 * @throws RangeError when an argument leaves its range
 *
 * Source: simplified CIPM formula; coefficients from memory, good to a few parts in 10⁴ near room conditions.
 * @example airDensityKgM3({ tempC: 20 }) // ≈ 1.1993
 */
export function airDensityKgM3({ tempC, pressureHPa = 1013.25, humidityPercent = 50 }: { tempC: number; pressureHPa?: number; humidityPercent?: number }): number {
  requireRange("tempC", tempC, tempC >= 5 && tempC <= 40);
  requireRange("pressureHPa", pressureHPa, pressureHPa >= 600 && pressureHPa <= 1100);
  requireRange("humidityPercent", humidityPercent, humidityPercent >= 0 && humidityPercent <= 100);
  return (0.34848 * pressureHPa - 0.009 * humidityPercent * Math.exp(0.061 * tempC)) / (273.15 + tempC);
}
