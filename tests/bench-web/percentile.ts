/** The value that the given share of all does not exceed; 0 of none. */
export function percentile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.ceil(share * sorted.length) - 1)] ?? 0;
}

export const told = (values: readonly number[]) => `median ${percentile(values, 0.5).toFixed(1)} ms, p95 ${percentile(values, 0.95).toFixed(1)} ms, worst ${Math.max(0, ...values).toFixed(1)} ms of ${values.length}`;
