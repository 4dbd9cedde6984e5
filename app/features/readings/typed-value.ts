import type { ReadingValue } from "#app/domain/reading.ts";
import { applyCorrection } from "#app/features/instruments/apply-correction.ts";
import type { NumberRule } from "./read-number.ts";
import type { ReadingInstrument } from "./reading-instrument.ts";

/**
 * A figure as it was typed, with the instrument's correction where one is in force and the figure was read on its scale:
 * then what it showed is kept beside, and the correction's uncertainty is added. A liquid's limit is the liquid's own.
 */
export function typedValue(read: number, typedText: string, { name, unit, u, isReadOnInstrument, isDifference }: NumberRule, instrument: ReadingInstrument | null): ReadingValue {
  const typed = { name, typedText: typedText.trim(), unit, formula: null };
  const corrected = isReadOnInstrument && name !== "limit" ? applyCorrection(instrument?.correction, { value: read, unit, isDifference }) : undefined;
  if (!corrected) return { ...typed, value: read, standardUncertainty: u };
  return { ...typed, value: inColumn(corrected.value), rawValue: read, standardUncertainty: u === null ? null : inColumn(Math.hypot(u, corrected.u)) };
}

/** At the precision that the database keeps. */
const inColumn = (value: number) => Number(value.toFixed(7));
