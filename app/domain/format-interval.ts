/** A range in print, "1.757–1.779", or one value where both ends print alike. */
export function formatInterval([low, high]: readonly [number, number], decimals: number): string {
  const [from, to] = [low.toFixed(decimals), high.toFixed(decimals)];
  return from === to ? from : `${from}–${to}`;
}
