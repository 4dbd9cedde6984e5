export type Outlier = Readonly<{ median: number; /** The modified z-score. */ z: number }>;

const fewest = 5;
const beyond = 3.5;
/** Of a normal distribution: from the median absolute deviation and from the mean one to the standard deviation. */
const fromMad = 1.4826022185056018;
const fromMeanAd = 1.2533141373155003;

/**
 * Values that stand apart from the middle of their column by the modified z-score of Iglewicz and Hoaglin (1993), by
 * median and median absolute deviation, which a few strangers do not move; where more than half are equal, by the mean
 * absolute deviation. Beyond 3.5 as they say, and by more than three standard uncertainties, so that the last digit of
 * an instrument makes no stranger. Fewer than five values say nothing.
 *
 * @param values undefined where a row has none
 * @param u standard uncertainty of one value, in its unit
 * @returns one entry a value
 */
export function robustOutliers(values: ReadonlyArray<number | undefined>, u: number): Array<Outlier | undefined> {
  const known = values.filter((value) => value !== undefined);
  if (known.length < fewest) return values.map(() => undefined);
  const median = medianOf(known);
  const deviations = known.map((value) => Math.abs(value - median));
  const mad = medianOf(deviations) * fromMad;
  const scale = mad > 0 ? mad : (deviations.reduce((sum, one) => sum + one, 0) / deviations.length) * fromMeanAd;
  if (scale === 0) return values.map(() => undefined);
  return values.map((value) => {
    if (value === undefined) return undefined;
    const z = (value - median) / scale;
    return Math.abs(z) > beyond && Math.abs(value - median) > 3 * u ? { median, z } : undefined;
  });
}

function medianOf(values: readonly number[]): number {
  const sorted = values.toSorted((a, b) => a - b);
  const middle = sorted.length / 2;
  return sorted.length % 2 ? sorted[Math.floor(middle)]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}
