import { percent } from "#app/components/charts/spectrum/spectrum-marks.tsx";
import { xUnitNames, xUnitSigns, yUnitNames } from "#app/features/spectra/spectrum-words.ts";
import type { MeasuredSpectrum } from "#app/gemmology/spectrum/measured-spectrum.ts";
import type { SpectrumPeak } from "#app/gemmology/spectrum/spectrum-peaks.ts";
import { plotAxes } from "./plot-axes.ts";
import { VisibleStrip } from "./visible-strip.tsx";

type MeasuredPlotProps = Pick<MeasuredSpectrum, "kind" | "xUnit" | "yUnit"> & { curve: ReadonlyArray<readonly [x: number, y: number]>; peaks: readonly SpectrumPeak[]; label: string };

const height = 260;
const strip = 8;
/** Two labels nearer than this share of the width would touch on a telephone. */
const leastGap = 0.1;

/** A measured spectrum with its axes and units. The table beside it says its peaks; this is a picture. */
export function MeasuredPlot({ curve, peaks, kind, xUnit, yUnit, label }: MeasuredPlotProps) {
  const { x, y, xTicks, yTicks, isPercent } = plotAxes(curve, { xUnit, yUnit });
  const xOfNm = (nm: number) => (xUnit === "nm" ? nm : xUnit === "um" ? nm / 1000 : 1e7 / nm);
  const path = curve.map(([one, other], at) => `${at === 0 ? "M" : "L"}${(x(one) * 1000).toFixed(1)} ${(y(other) * 1000).toFixed(1)}`).join("");
  const marks = labelledPeaks(peaks.map((peak) => ({ ...peak, share: x(xOfNm(peak.nm)), text: String(Number(xOfNm(peak.nm).toPrecision(4))) })));
  return (
    <figure aria-label={label} className="min-w-0">
      <p className="mb-1 text-xs text-ink-3">
        {yUnitNames[yUnit]}
        {isPercent ? ", %" : ""}
      </p>
      <div className="grid grid-cols-[2.75rem_minmax(0,1fr)]" role="img" aria-label={`${label}: ${kind === "curve" ? "curve" : "table of peaks"} over ${xUnitNames[xUnit].toLowerCase()}`}>
        <svg width="100%" height={height} aria-hidden="true" className="block overflow-visible">
          {yTicks.map(({ share, text }) => (
            <text key={text} x="92%" y={share * height + 4} textAnchor="end" className="fill-ink-3 font-mono text-[11px]">
              {text}
            </text>
          ))}
        </svg>
        <svg width="100%" height={height} aria-hidden="true" className="block overflow-visible [print-color-adjust:exact]">
          <rect width="100%" height={height} className="fill-sunken" />
          <VisibleStrip shareOfNm={(nm) => x(xOfNm(nm))} top={height - strip} height={strip} />
          {yTicks.map(({ share, text }) => (
            <line key={text} x1="0" x2="100%" y1={share * height} y2={share * height} className="stroke-rule-2" strokeDasharray="2 3" />
          ))}
          {marks.map(({ nm, share, text, hasLabel }) => (
            <g key={nm}>
              <line x1={percent(share)} x2={percent(share)} y1={hasLabel ? 16 : 22} y2={height} className="stroke-tint" strokeOpacity={hasLabel ? 0.55 : 0.25} />
              {hasLabel ? (
                <text x={percent(share)} y="12" textAnchor={share < 0.04 ? "start" : share > 0.96 ? "end" : "middle"} className="fill-tint font-mono text-[11px]">
                  {text}
                </text>
              ) : null}
            </g>
          ))}
          <svg width="100%" height={height} viewBox="0 0 1000 1000" preserveAspectRatio="none" overflow="hidden">
            {kind === "curve" ? (
              <path d={path} className="fill-none stroke-ink" strokeWidth="1.5" strokeLinejoin="round" vectorEffect="non-scaling-stroke" />
            ) : (
              curve.map(([one, other]) => <line key={one} x1={x(one) * 1000} x2={x(one) * 1000} y1={y(other) * 1000} y2="1000" className="stroke-ink" strokeWidth="1.5" vectorEffect="non-scaling-stroke" />)
            )}
          </svg>
        </svg>
        <span />
        <svg width="100%" height="34" aria-hidden="true" className="block overflow-visible">
          {xTicks.map(({ share, text }) => (
            <g key={text}>
              <line x1={percent(share)} x2={percent(share)} y1="0" y2="5" className="stroke-edge" />
              <text x={percent(share)} y="17" textAnchor={share < 0.04 ? "start" : share > 0.96 ? "end" : "middle"} className="fill-ink-3 font-mono text-[11px]">
                {text}
              </text>
            </g>
          ))}
          <text x="100%" y="31" textAnchor="end" className="fill-ink-3 text-[11px]">
            {xUnitNames[xUnit]}
          </text>
        </svg>
      </div>
      <figcaption className="sr-only">
        {peaks.length === 0 ? "No peaks." : `Peaks at ${peaks.map(({ nm }) => `${Number(xOfNm(nm).toPrecision(5))} ${xUnitSigns[xUnit]}`).join(", ")}.`}
      </figcaption>
    </figure>
  );
}

/** The most prominent peaks get their number, as long as it does not touch another's. */
function labelledPeaks<Peak extends { share: number; prominence: number | null }>(peaks: readonly Peak[]): (Peak & { hasLabel: boolean })[] {
  const taken: number[] = [];
  const strongest = peaks.toSorted((a, b) => (b.prominence ?? 0) - (a.prominence ?? 0));
  const labelled = new Set(strongest.filter(({ share }) => (taken.every((other) => Math.abs(other - share) >= leastGap) ? (taken.push(share), true) : false)));
  return peaks.map((peak) => ({ ...peak, hasLabel: labelled.has(peak) }));
}
