import { SpectrumFileError, type MeasuredSpectrum } from "./measured-spectrum.ts";
import { fewestSpectrumPoints, spectrumRangeNm } from "./spectrum-limits.ts";
import { wavelengthNm } from "./wavelength-nm.ts";

type Points = Readonly<{ x: number; y: number; line: number | null }>;

/** Above this a "share" of light can only be per cent. */
const largestShare = 2;

/**
 * What every reader ends with: enough points, an axis that goes one way and means light, shares as shares.
 * @throws SpectrumFileError
 */
export function checkedSpectrum({ points, ...spectrum }: Omit<MeasuredSpectrum, "xs" | "ys"> & { points: readonly Points[] }): MeasuredSpectrum {
  const notes = [...spectrum.notes];
  const isCurve = spectrum.kind === "curve";
  if (points.length < (isCurve ? fewestSpectrumPoints : 1)) throw new SpectrumFileError(null, isCurve ? `A spectrum has at least ${fewestSpectrumPoints} points; this file has ${points.length}.` : "The table of peaks is empty.");
  const sorted = isCurve ? points : points.toSorted((a, b) => a.x - b.x);
  const isRising = sorted.length < 2 || sorted[1]!.x > sorted[0]!.x;
  sorted.forEach(({ x, y, line }, at) => {
    if (!Number.isFinite(x) || !Number.isFinite(y)) throw new SpectrumFileError(line, "A value here is larger than any number that can be kept.");
    const nm = x > 0 ? wavelengthNm(x, spectrum.xUnit) : Number.NaN;
    if (!(nm >= spectrumRangeNm.from && nm <= spectrumRangeNm.to)) throw new SpectrumFileError(line, `${x} ${unitNames[spectrum.xUnit]} is no light that a bench instrument reads. Is the unit another?`);
    const before = sorted[at - 1];
    if (isCurve && before && (before.x === x || x > before.x !== isRising)) {
      throw new SpectrumFileError(line, before.x === x ? `${x} stands here a second time: every place on the axis comes once.` : `${x} follows ${before.x}, against the way that the axis went before.`);
    }
  });
  const isShare = spectrum.yUnit === "transmittance" || spectrum.yUnit === "reflectance";
  const largest = sorted.reduce((most, { y }) => Math.max(most, y), -Infinity);
  const factor = isShare && largest > largestShare ? 0.01 : 1;
  if (factor !== 1) notes.push(`The ${spectrum.yUnit} goes up to ${Number(largest.toPrecision(4))}, so it was read as per cent.`);
  return { ...spectrum, notes, xs: sorted.map(({ x }) => x), ys: sorted.map(({ y }) => y * factor) };
}

const unitNames = { nm: "nm", um: "µm", "1/cm": "cm⁻¹" } as const;
