import type { ScaleUnit } from "#app/domain/instrument-scale.ts";
import { correctDifference, correctReading, inUnit, type Corrected, type Correction } from "#app/gemmology/calibration/correction.ts";

/** A correction in force, with the unit of the scale that it is for. */
export type AppliedCorrection = Readonly<{ correction: Correction; unit: ScaleUnit }>;

const carats: Partial<Record<ScaleUnit, number>> = { ct: 1, g: 5 };

/**
 * A figure read on an instrument, corrected; undefined where no correction bears on it, because none is in force or it
 * is for another quantity.
 *
 * @param unit of the figure, which for a mass need not be the scale's
 * @param isDifference two readings taken from each other: an offset drops out
 */
export function applyCorrection(applied: AppliedCorrection | null | undefined, { value, unit, isDifference = false }: { value: number; unit: string; isDifference?: boolean }): Corrected | undefined {
  if (!applied) return undefined;
  const [from, to] = [carats[applied.unit], carats[unit as ScaleUnit]];
  const factor = applied.unit === unit ? 1 : from && to ? from / to : undefined;
  if (factor === undefined) return undefined;
  const correction = inUnit(applied.correction, factor);
  return isDifference ? correctDifference(correction, value) : correctReading(correction, value);
}
