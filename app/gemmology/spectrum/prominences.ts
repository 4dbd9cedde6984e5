export type LocalMaximum = Readonly<{
  /** The middle of the top, an index into the values; a flat top has its middle point, the earlier of two. */
  at: number;
  /** How far it stands above the higher of the two lowest points that part it from higher ground on either side, or from the end. */
  prominence: number;
}>;

/**
 * Every local maximum of a curve, in order, with its topographic prominence. The ends of the curve are none, and a flat
 * top counts once.
 * Time grows with the number of values, not with its square.
 */
export function prominencesOf(values: readonly number[]): LocalMaximum[] {
  const lowestBefore = lowestSinceHigher(values);
  const lowestAfter = lowestSinceHigher(values.toReversed()).reverse();
  const maxima: LocalMaximum[] = [];
  for (let start = 1; start < values.length - 1; start++) {
    const value = values[start]!;
    if (!(values[start - 1]! < value)) continue;
    let end = start;
    while (end + 1 < values.length && values[end + 1] === value) end++;
    if (end + 1 < values.length && values[end + 1]! < value) maxima.push({ at: Math.floor((start + end) / 2), prominence: value - Math.max(lowestBefore[start]!, lowestAfter[end]!) });
    start = end;
  }
  return maxima;
}

/** For every place the lowest value between it and the nearest higher one before it, or the start. */
function lowestSinceHigher(values: readonly number[]): number[] {
  const stack: { value: number; lowest: number }[] = [];
  return values.map((value) => {
    let lowest = value;
    while (stack.length > 0 && stack.at(-1)!.value <= value) lowest = Math.min(lowest, stack.pop()!.lowest);
    stack.push({ value, lowest });
    return lowest;
  });
}
