import { Icon, type IconName } from "#app/components/ui/icon.tsx";

export type LaneVerdict = "agrees" | "strained" | "contradicts";

type EvidenceLaneProps = {
  /** The property: "Low index", "Density". */
  label: string;
  unit?: string;
  /** The species' range. */
  referenceLow: number;
  referenceHigh: number;
  /** The same in print: "1.757–1.770". */
  referenceText: string;
  /** What was measured: one value, or a range of values; neither where the test has not been made. */
  observed?: number;
  observedLow?: number;
  observedHigh?: number;
  /** Standard uncertainty of the measured value; the whisker reaches ±2u. */
  u?: number;
  /** The measured value in print. */
  observedText?: string;
  /** What the lane spans. The lanes of one property share it, so that candidates can be compared by eye. */
  axisMin: number;
  axisMax: number;
  verdict?: LaneVerdict;
};

const verdicts: Readonly<Record<LaneVerdict, { word: string; icon: IconName; text: string; bar: string; mark: string }>> = {
  agrees: { word: "agrees", icon: "check", text: "text-green", bar: "fill-green/35", mark: "stroke-green" },
  strained: { word: "strained", icon: "alert", text: "text-straw", bar: "fill-straw-mark/45", mark: "stroke-straw" },
  contradicts: { word: "contradicts", icon: "cross", text: "text-red", bar: "fill-red/35", mark: "stroke-red" },
};

/**
 * One property of one candidate: the species' range as a bar, the measured value as a tick with a whisker of ±2u, and the
 * verdict in a word. Drawn in percents of its own width, so that the server can draw it and no script has to measure.
 */
export function EvidenceLane(props: EvidenceLaneProps) {
  const { label, unit, referenceLow, referenceHigh, referenceText, observedText, axisMin, axisMax, verdict, u = 0 } = props;
  const low = props.observedLow ?? props.observed;
  const high = props.observedHigh ?? props.observed;
  const isMeasured = low !== undefined && high !== undefined;
  const look = verdict ? verdicts[verdict] : null;

  // 3 % at either end is kept for what lies beyond the axis.
  const at = (value: number) => 3 + 94 * Math.min(1, Math.max(0, (value - axisMin) / (axisMax - axisMin)));
  const percent = (share: number) => `${share.toFixed(2)}%`;
  const barWidth = Math.max(1.4, at(referenceHigh) - at(referenceLow));
  const isBelow = isMeasured && high < axisMin;
  const isAbove = isMeasured && low > axisMax;
  const mark = look?.mark ?? "stroke-ink-2";

  return (
    <div className="grid grid-cols-[5.25rem_minmax(0,1fr)_5.75rem] items-center gap-x-2.5 sm:grid-cols-[5.25rem_minmax(0,1fr)_6.25rem_5.75rem] text-xs leading-5">
      <span className="truncate text-ink-2">{label}</span>
      <svg width="100%" height="16" className="block overflow-visible [print-color-adjust:exact]" aria-hidden="true">
        <line x1="0" x2="100%" y1="8" y2="8" className="stroke-rule-2" />
        <rect x={percent(at(referenceLow) - (barWidth > at(referenceHigh) - at(referenceLow) ? 0.7 : 0))} width={percent(barWidth)} y="4.5" height="7" rx="2" className={look?.bar ?? "fill-ink-3/30"} />
        {isMeasured && !isBelow && !isAbove ? (
          <g className={mark} strokeWidth="2">
            <line x1={percent(at(low - 2 * u))} x2={percent(at(high + 2 * u))} y1="8" y2="8" />
            <line x1={percent(at(low))} x2={percent(at(low))} y1="2.5" y2="13.5" strokeLinecap="round" />
            {high > low ? <line x1={percent(at(high))} x2={percent(at(high))} y1="2.5" y2="13.5" strokeLinecap="round" /> : null}
          </g>
        ) : null}
        {isBelow || isAbove ? (
          // Off the lane: an arrow at the end that it lies beyond.
          <svg x={isBelow ? "0" : "100%"} y="0" width="1" height="16" overflow="visible" className={`fill-none ${mark}`} strokeWidth="2" strokeLinecap="round" strokeLinejoin="round">
            <path d={isBelow ? "M7 4 3 8l4 4M3 8h9" : "m-7 4 4 4-4 4M-3 8h-9"} />
          </svg>
        ) : null}
      </svg>
      <span className="font-mono whitespace-nowrap text-ink-3 max-sm:col-start-2 max-sm:row-start-2">
        <span className="sr-only">{isMeasured ? `measured ${observedText ?? (high > low ? `${low} to ${high}` : low)}, ` : "not measured, "}species </span>
        {referenceText}
        {unit ? <span className="font-sans"> {unit}</span> : null}
      </span>
      <span className={`flex items-center gap-1 font-medium ${look?.text ?? "text-ink-3"}`}>
        {look ? <Icon name={look.icon} sizePx={12} /> : null}
        {look?.word ?? "not tested"}
      </span>
    </div>
  );
}
