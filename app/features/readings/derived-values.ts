import type { ReadingValue, WeighingMethod } from "#app/domain/reading.ts";
import { hydrostaticDensity } from "#app/gemmology/density/hydrostatic-density.ts";
import { indexFromCriticalAngle } from "#app/gemmology/optics/index-from-critical-angle.ts";
import { birefringenceUncertainty, usualUncertainty } from "./usual-uncertainty.ts";

/*
 * Numbers that follow from what was read. Each names its formula with a version: a reading keeps the value that its
 * formula gave on the day, and a changed formula gets the next version.
 */

export function differenceOfEdges({ low, high, edgeUncertainty }: { low: number; high: number; edgeUncertainty: number }): ReadingValue {
  return derived("birefringence", { value: high - low, unit: "1", u: birefringenceUncertainty(edgeUncertainty), formula: "difference of edges v1" });
}

/** In ordinary air, whose buoyancy the formula takes off. */
export function derivedDensity({ method, massAirCt, massLiquidCt, tempC, uAirCt, uLiquidCt }: { method: WeighingMethod; massAirCt: number; massLiquidCt: number; tempC: number; uAirCt: number; uLiquidCt: number }): ReadingValue {
  const { sg, uSg } = hydrostaticDensity({ method, massAirCt, massLiquidCt, tempC, uMassAirCt: uAirCt, uMassLiquidCt: uLiquidCt, uTempC: usualUncertainty.waterTempC });
  return derived("sg", { value: sg, unit: "1", u: uSg, formula: `hydrostatic density, ${method === "suspended" ? "hung in water" : "beaker on the pan"} v1` });
}

export function derivedIndex({ angleDeg, prismN, uAngleDeg, uPrismN }: { angleDeg: number; prismN: number; uAngleDeg: number; uPrismN: number }): ReadingValue {
  const { n, u } = indexFromCriticalAngle({ angleDeg, prismN, uAngleDeg, uPrismN });
  return derived("n", { value: n, unit: "n", u, formula: "n = prism index × sin angle v1" });
}

const columnDecimals = 7;
const round = (value: number) => Number(value.toFixed(columnDecimals));

export function derived(name: ReadingValue["name"], { value, unit, u, formula }: { value: number; unit: ReadingValue["unit"]; u: number; formula: string }): ReadingValue {
  return { name, value: round(value), typedText: "", unit, standardUncertainty: round(u), formula };
}
