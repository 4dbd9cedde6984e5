/**
 * A curve with fewer points that looks the same where it is drawn small: of every stretch its first, lowest, highest and
 * last point stay, in their order, so that no peak is lost.
 * @param most how many points are wanted at the most, ≥ 8
 */
export function thinCurve(points: ReadonlyArray<readonly [x: number, y: number]>, most: number): ReadonlyArray<readonly [x: number, y: number]> {
  if (points.length <= most) return points;
  const stretches = Math.max(1, Math.floor(most / 4));
  const kept: (readonly [number, number])[] = [];
  for (let stretch = 0; stretch < stretches; stretch++) {
    const from = Math.floor((stretch * points.length) / stretches);
    const to = Math.floor(((stretch + 1) * points.length) / stretches) - 1;
    let [low, high] = [from, from];
    for (let at = from; at <= to; at++) {
      if (points[at]![1] < points[low]![1]) low = at;
      if (points[at]![1] > points[high]![1]) high = at;
    }
    for (const at of [...new Set([from, low, high, to])].sort((a, b) => a - b)) kept.push(points[at]!);
  }
  return kept;
}
