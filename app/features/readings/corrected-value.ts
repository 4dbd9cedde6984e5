import type { ReadingValue } from "#app/domain/reading.ts";
import { applyCorrection } from "#app/features/instruments/apply-correction.ts";
import type { NumberRule } from "./read-number.ts";
import type { ReadingInstrument } from "./reading-instrument.ts";

/**
 * A figure as it is kept: read, and corrected where a correction of its instrument is in force; what was read stays beside
 * it. The contact liquid's limit is the liquid's own; everything else read on a scale shares the scale's error.
 *
 * @param digits as typed
 */
export function correctedValue(read: number, digits: string, { name, unit, u, isReadOnInstrument, isDifference }: NumberRule, instrument: ReadingInstrument | null): ReadingValue {
  const typed = { name, typedText: digits.trim(), unit, formula: null };
  const corrected = isReadOnInstrument && name !== "limit" ? applyCorrection(instrument?.correction, { value: read, unit, isDifference }) : undefined;
  if (!corrected) return { ...typed, value: read, standardUncertainty: u };
  return { ...typed, value: inColumn(corrected.value), rawValue: read, standardUncertainty: u === null ? null : inColumn(Math.hypot(u, corrected.u)) };
}

/** At the precision that the database keeps. */
const inColumn = (value: number) => Number(value.toFixed(7));
