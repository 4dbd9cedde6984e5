import { solve } from "../linear/solve.ts";
import { absorbanceOf } from "./absorbance.ts";
import type { MeasuredSpectrum } from "./measured-spectrum.ts";
import { prominencesOf } from "./prominences.ts";
import { wavelengthNm } from "./wavelength-nm.ts";

export type SpectrumPeak = Readonly<{
  nm: number;
  /** Where it has fallen by half its prominence on both sides; null for a peak that a table gives without one. */
  widthNm: number | null;
  /** In the unit of the values that were searched. */
  prominence: number | null;
  kind: "line" | "band";
}>;
/** How the peaks were found, in words to be shown beside them. */
export const peakMethod = "Local maxima of absorbance by topographic prominence: at least a fiftieth of the range, and six times the noise from point to point.";

/** Common practice: what is narrower is spoken of as a line. */
const widestLineNm = 8;
const leastShareOfRange = 0.02;
const leastOverNoise = 6;
const mostPeaks = 24;
/** Of a peak's prominence from its top, where its middle is sought. */
const topShare = 0.3;

/**
 * Peaks to offer of a measured spectrum, the most prominent ones, in the order of their wavelength. A person decides
 * which of them are the stone's. Transmittance and reflectance are searched as absorbance; arbitrary units as they are.
 */
export function spectrumPeaks(spectrum: MeasuredSpectrum): SpectrumPeak[] {
  const nms = spectrum.xs.map((x) => wavelengthNm(x, spectrum.xUnit));
  if (spectrum.kind === "peakTable") {
    const strongest = nms.map((nm, at) => ({ nm, y: absorbanceOf(spectrum)[at]! })).sort((a, b) => b.y - a.y).slice(0, mostPeaks);
    return strongest.map(({ nm }) => ({ nm, widthNm: null, prominence: null, kind: "line" as const })).sort((a, b) => a.nm - b.nm);
  }
  const isRising = nms[0]! < nms.at(-1)!;
  const [axis, values] = isRising ? [nms, absorbanceOf(spectrum)] : [nms.reverse(), absorbanceOf(spectrum).reverse()];
  const range = values.reduce((most, value) => Math.max(most, value), -Infinity) - values.reduce((least, value) => Math.min(least, value), Infinity);
  const least = Math.max(leastShareOfRange * range, leastOverNoise * noiseOf(values));
  return prominencesOf(values)
    .filter(({ prominence }) => prominence > 0 && prominence >= least)
    .sort((a, b) => b.prominence - a.prominence)
    .slice(0, mostPeaks)
    .map(({ at, prominence }) => {
      const widthNm = widthAt(axis, values, at, values[at]! - prominence / 2);
      return { nm: topOf(axis, values, at, prominence), widthNm, prominence, kind: widthNm <= widestLineNm ? ("line" as const) : ("band" as const) };
    })
    .sort((a, b) => a.nm - b.nm);
}

/**
 * The standard deviation of what jumps from point to point, from the median of the second differences' size: of white
 * noise σ these have the deviation σ√6, and the median of a normal deviate's size is 0.6745 of its deviation.
 */
function noiseOf(values: readonly number[]): number {
  const jumps = values.slice(2).map((value, at) => Math.abs(value - 2 * values[at + 1]! + values[at]!)).sort((a, b) => a - b);
  return jumps.length === 0 ? 0 : jumps[Math.floor(jumps.length / 2)]! / (0.6745 * Math.sqrt(6));
}

/**
 * The top of the parabola of least squares through all that stands in the highest three tenths of a peak, so that noise
 * moves it little; through its neighbours where these are few; of a flat top its middle.
 */
function topOf(axis: readonly number[], values: readonly number[], at: number, prominence: number): number {
  if (values[at - 1] === values[at] || values[at + 1] === values[at]) return middleOfFlat(axis, values, at);
  const level = values[at]! - topShare * prominence;
  let [start, end] = [at - 1, at + 1];
  while (start > 0 && values[start - 1]! > level) start--;
  while (end + 1 < values.length && values[end + 1]! > level) end++;
  // Powers of the distance from the highest point, in units of the stretch, summed for the normal equations.
  const unit = axis[end]! - axis[start]!;
  const sums = [0, 0, 0, 0, 0];
  const right = [0, 0, 0];
  for (let index = start; index <= end; index++) {
    const x = (axis[index]! - axis[at]!) / unit;
    for (let power = 0; power <= 4; power++) sums[power]! += x ** power;
    for (let power = 0; power <= 2; power++) right[power]! += (values[index]! - values[at]!) * x ** power;
  }
  const [, slope, bend] = solve([sums.slice(0, 3), sums.slice(1, 4), sums.slice(2, 5)], right) as [number, number, number];
  const top = axis[at]! - (unit * slope) / (2 * bend);
  return bend < 0 && top >= axis[start]! && top <= axis[end]! ? top : axis[at]!;
}

function middleOfFlat(axis: readonly number[], values: readonly number[], at: number): number {
  let [start, end] = [at, at];
  while (values[start - 1] === values[at]) start--;
  while (values[end + 1] === values[at]) end++;
  return (axis[start]! + axis[end]!) / 2;
}

function widthAt(axis: readonly number[], values: readonly number[], at: number, level: number): number {
  const crossing = (step: 1 | -1): number => {
    let here = at;
    while (values[here + step] !== undefined && values[here + step]! > level) here += step;
    const next = here + step;
    if (values[next] === undefined) return axis[here]!;
    return axis[here]! + ((values[here]! - level) / (values[here]! - values[next]!)) * (axis[next]! - axis[here]!);
  };
  return crossing(1) - crossing(-1);
}
