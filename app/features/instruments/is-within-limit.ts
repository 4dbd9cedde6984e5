const scale = 1_000_000;

/** In steps of a millionth, so that 1.545 against 1.544 ± 0.001 is within, as it is on paper. */
export function isWithinLimit({ nominal, reading, limit }: { nominal: number; reading: number; limit: number }): boolean {
  return Math.abs(Math.round(reading * scale) - Math.round(nominal * scale)) <= Math.round(limit * scale);
}
