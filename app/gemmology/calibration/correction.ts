/**
 * What is added to a reading to bring it to the reference's scale: offset + slope · (reading − centre). A mere offset has
 * slope 0. About the centre the offset and the slope are uncorrelated, so their uncertainties add squared.
 */
export type Correction = Readonly<{
  model: "offset" | "line";
  /** Of the readings that it was worked out from, in the instrument's unit. */
  centre: number;
  /** In the instrument's unit. */
  offset: number;
  slope: number;
  uOffset: number;
  uSlope: number;
}>;

/** The correction as a + b · x. */
export function asLine({ centre, offset, slope }: Correction): { a: number; b: number } {
  return { a: offset - slope * centre, b: slope };
}

export type Corrected = Readonly<{ value: number; /** What was added. */ added: number; /** Standard uncertainty of what was added. */ u: number }>;

/** A reading on the instrument's scale, corrected. */
export function correctReading(correction: Correction, reading: number): Corrected {
  const { centre, offset, slope, uOffset, uSlope } = correction;
  const fromCentre = reading - centre;
  const added = offset + slope * fromCentre;
  return { value: reading + added, added, u: Math.hypot(uOffset, uSlope * fromCentre) };
}

/** A difference of two readings on the scale (what a beaker gained): the offset is in both and drops out. */
export function correctDifference({ slope, uSlope }: Correction, difference: number): Corrected {
  const added = slope * difference;
  return { value: difference + added, added, u: Math.abs(uSlope * difference) };
}

/** The same correction for a scale in another unit: grams to carats with a factor of 5. */
export function inUnit(correction: Correction, factor: number): Correction {
  const { centre, offset, uOffset } = correction;
  return { ...correction, centre: centre * factor, offset: offset * factor, uOffset: uOffset * factor };
}
