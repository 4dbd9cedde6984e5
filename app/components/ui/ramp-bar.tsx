type RampBarProps = {
  /** What is full, or how far it is: "Held in safe 1". */
  label: string;
  /** 0 to 1; beyond that the bar is full. */
  share: number;
  /** The same in words and units: "182 400 of 250 000 EUR". */
  valueText: string;
  /** "progress" for work that is running, "meter" for how full something is. */
  kind?: "progress" | "meter";
};

/** A bar filled with the interference ramp: the further, the higher the order. */
export function RampBar({ label, share, valueText, kind = "meter" }: RampBarProps) {
  const shown = Math.min(1, Math.max(0, share));
  return (
    <div
      role={kind === "meter" ? "meter" : "progressbar"}
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={Math.round(shown * 100)}
      aria-valuetext={valueText}
      className="ramp h-2 overflow-hidden rounded-full forced-colors:outline"
    >
      {/* The ramp lies full width below; what is still to come is covered, so no style attribute is needed. */}
      <svg width="100%" height="100%" className="block" aria-hidden="true">
        <rect x={`${shown * 100}%`} y="0" width={`${(1 - shown) * 100}%`} height="100%" className="fill-track" />
      </svg>
    </div>
  );
}
