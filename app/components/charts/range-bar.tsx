/** A range on a scale that its row shares, so that the eye compares across columns; the words beside it say the same. */
export function RangeBar({ low, high, axisMin, axisMax }: { low: number; high: number; axisMin: number; axisMax: number }) {
  const width = axisMax - axisMin;
  const at = (value: number) => (width === 0 ? 50 : 2 + (96 * (value - axisMin)) / width);
  const barWidth = Math.max(1.6, at(high) - at(low));
  const left = Math.min(98.4, at(low) - (barWidth > at(high) - at(low) ? 0.8 : 0));
  return (
    <svg width="100%" height="10" className="block [print-color-adjust:exact]" aria-hidden="true">
      <line x1="0" x2="100%" y1="5" y2="5" className="stroke-rule-2" />
      <rect x={`${left.toFixed(2)}%`} width={`${barWidth.toFixed(2)}%`} y="2" height="6" rx="2" className="fill-tint/70" />
    </svg>
  );
}
