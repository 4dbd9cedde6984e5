import { SpectrumFileError } from "./measured-spectrum.ts";
import type { AbscissaCheck, OrdinateLines } from "./ordinate-lines.ts";

/** What the file's records say of its axis; undefined where it does not. */
export type AxisRecords = Readonly<{ firstX?: number; lastX?: number; deltaX?: number; pointCount?: number; xFactor: number }>;

/**
 * The abscissae of ordinates at equal steps, from what the records say, and held against the abscissa that every line
 * begins with: a line that was lost or doubled shows.
 * @throws SpectrumFileError where counts or abscissae do not fit
 */
export function evenSteps({ ordinates, abscissae }: OrdinateLines, { firstX, lastX, deltaX, pointCount, xFactor }: AxisRecords): number[] {
  const count = ordinates.length;
  if (pointCount !== undefined && pointCount !== count) throw new SpectrumFileError(null, `The file announces ${pointCount} points (NPOINTS) and holds ${count}: it is not complete, or was changed.`);
  const first = firstX ?? (abscissae[0] ? abscissae[0].x * xFactor : undefined);
  if (first === undefined) throw new SpectrumFileError(null, "There is no ordinate in the data table.");
  const step = lastX !== undefined && count > 1 ? (lastX - first) / (count - 1) : deltaX;
  if (step === undefined || step === 0) throw new SpectrumFileError(null, "The file does not say where its axis ends (LASTX) nor how wide its steps are (DELTAX).");
  for (const check of abscissae) requireFit(check, { first, step, xFactor });
  return ordinates.map((_, at) => (at === count - 1 && lastX !== undefined ? lastX : first + at * step));
}

function requireFit({ line, x, resolution, at, isRepeat }: AbscissaCheck, { first, step, xFactor }: { first: number; step: number; xFactor: number }): void {
  const expected = first + at * step;
  const tolerance = Math.abs(step) / 2 + resolution * Math.abs(xFactor);
  // Some programs write the abscissa of the next new ordinate before a repeated one.
  const isFitting = [expected, ...(isRepeat ? [expected + step] : [])].some((one) => Math.abs(x * xFactor - one) <= tolerance);
  if (!isFitting) throw new SpectrumFileError(line, `This line begins at ${round(x * xFactor)}, where the count of points so far leads to ${round(expected)}: points are missing or too many before it.`);
}

const round = (x: number) => Number(x.toPrecision(8));
