/** ln Σ exp(xᵢ) without overflow; −∞ for an empty list. */
export function logSumExp(values: readonly number[]): number {
  let most = -Infinity;
  for (const value of values) if (value > most) most = value;
  if (most === -Infinity) return -Infinity;
  let sum = 0;
  for (const value of values) sum += Math.exp(value - most);
  return most + Math.log(sum);
}
