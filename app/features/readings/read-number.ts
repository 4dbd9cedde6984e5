import { decimalPlaces, parseDecimal } from "#app/domain/decimal.ts";
import type { ReadingValue, ReadingValueName } from "#app/domain/reading.ts";
import type { ReadingInstrument } from "./reading-instrument.ts";

/** What a number of a reading may be. `what` names it in a sentence: "the low edge". */
export type NumberRule = Readonly<{ name: ReadingValueName; what: string; unit: ReadingValue["unit"]; example: string; min: number; max: number; mostDecimals: number; isReadOnInstrument?: boolean; /** Two readings taken from each other. */ isDifference?: boolean; isWhole?: boolean; u: number | null }>;

/** The number, or the sentence that says why it is none. */
export function readNumber(text: string, { what, unit, example, min, max, mostDecimals, isReadOnInstrument, isWhole, name }: NumberRule, instrument: ReadingInstrument | null): number | string {
  if (text.trim() === "") return `Write ${what}.`;
  const value = text.length > 24 ? undefined : parseDecimal(text);
  if (value === undefined) return `Write ${what} as it is shown, in digits: for example ${example}.`;
  if (isWhole && !Number.isInteger(value)) return `Write ${what} as a whole number: for example ${example}.`;
  if (unit === "ct" && (name === "massLiquidCt" ? value < 0 : value <= 0)) return name === "massLiquidCt" ? `${sentence(what)} is not less than zero.` : `${sentence(what)} is more than zero.`;
  if (value < min) return unit === "mm" ? `${sentence(what)} is at least ${min} mm.` : outside(what, unit, min, max);
  if (value > max) return unit === "ct" || unit === "mm" ? `At most ${max} ${unit}: is the unit right?` : outside(what, unit, min, max);
  const decimals = decimalPlaces(text);
  if (decimals > mostDecimals) return `At most ${mostDecimals} decimals.`;
  const step = isReadOnInstrument ? instrument?.resolution : null;
  if (step && decimals > Math.max(decimalsOf(step), 2)) return `This instrument is read to ${step}: write the digits that it shows.`;
  return value;
}

const unitWords: Partial<Record<ReadingValue["unit"], string>> = { deg: "°", degC: " °C", cm: " cm", s: " s", x: "×", "%": " %" };

function outside(what: string, unit: ReadingValue["unit"], min: number, max: number): string {
  const words = unitWords[unit] ?? "";
  return `${sentence(what)} lies between ${min}${words} and ${max}${words}.`;
}

function decimalsOf(step: number): number {
  return /\.(\d+)$/.exec(step.toFixed(6).replace(/0+$/, ""))?.[1]?.length ?? 0;
}

const sentence = (text: string) => text[0]!.toUpperCase() + text.slice(1);
