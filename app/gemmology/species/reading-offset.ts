import type { Interval } from "./species-table.ts";

/** What was measured of one property, with its standard uncertainty, > 0. */
export type MeasuredPoint = Readonly<{ value: number; u: number }>;
/** How far a reading lies from the nearest end of a range: 0 within, negative where the range lies below; and in units of u. */
export type Offset = Readonly<{ gap: number; inU: number }>;

/**
 * @param range what a species spans
 * @returns the least distance from the reading to the range, signed as the range lies from the reading
 */
export function readingOffset({ value, u }: MeasuredPoint, [low, high]: Interval): Offset {
  const gap = value < low ? low - value : value > high ? high - value : 0;
  return { gap, inU: gap / u };
}
