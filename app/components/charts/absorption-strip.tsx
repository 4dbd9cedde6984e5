import type { Absorption } from "#app/gemmology/species/species-row.ts";

const shown = { from: 400, to: 700 } as const;
const opacity = { 1: 0.3, 2: 0.6, 3: 0.95 } as const;

/** The visible spectrum as a hand spectroscope shows it, red on the left: lines and bands dark, as strong as they are. The list beside it says the same. */
export function AbsorptionStrip({ absorption }: { absorption: readonly Absorption[] }) {
  const x = (nm: number) => (100 * (shown.to - nm)) / (shown.to - shown.from);
  const percent = (nm: number) => `${Math.min(100, Math.max(0, x(nm))).toFixed(2)}%`;
  return (
    <svg width="100%" height="48" className="block [print-color-adjust:exact]" aria-hidden="true">
      <rect width="100%" height="28" rx="3" className="fill-track" />
      {absorption.map(({ nm, kind, width_nm: widthNm, strength }, at) => {
        // A cut-off takes everything towards the violet; a line is at least as wide as it can be seen.
        const half = kind === "cutoff" ? 0 : (widthNm ?? (kind === "line" ? 2 : 40)) / 2;
        const [left, right] = kind === "cutoff" ? [nm, shown.from] : [nm + Math.max(half, 0.7), nm - Math.max(half, 0.7)];
        if (left < shown.from || right > shown.to) return null;
        const width = Math.min(100, x(right)) - Math.max(0, x(left));
        return <rect key={at} x={percent(left)} width={`${width.toFixed(2)}%`} height="28" className="fill-ink" fillOpacity={opacity[strength as 1 | 2 | 3] ?? 0.3} />;
      })}
      {[700, 650, 600, 550, 500, 450, 400].map((nm) => (
        <g key={nm}>
          <line x1={percent(nm)} x2={percent(nm)} y1="28" y2="33" className="stroke-rule-2" />
          <text x={percent(nm)} y="45" textAnchor={nm === 700 ? "start" : nm === 400 ? "end" : "middle"} className="fill-ink-3 font-mono text-[10.5px]">
            {nm}
            {nm === 400 ? " nm" : ""}
          </text>
        </g>
      ))}
    </svg>
  );
}
