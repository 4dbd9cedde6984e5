import type { Lane } from "#app/features/identification/bench-ranking.ts";

const verdictWords = { agrees: "agrees", strained: "strained", contradicts: "contradicts" } as const;
const bars = { agrees: "fill-green/35", strained: "fill-straw-mark/40", contradicts: "fill-red/30" } as const;
const ticks = { agrees: "stroke-green", strained: "stroke-straw-mark", contradicts: "stroke-red" } as const;
const texts = { agrees: "text-ink-3", strained: "text-straw", contradicts: "text-red" } as const;

/** A lane a property: the species' range as a bar, what was measured as a tick with a whisker of ±2u. */
export function EvidenceLanes({ lanes, name }: { lanes: readonly Lane[]; name: string }) {
  return (
    <ul aria-label={`Evidence for ${name}`} className="grid gap-y-0.5">
      {lanes.map((lane) => (
        <li key={lane.property} className="grid grid-cols-[5.5rem_minmax(0,1fr)_8.5rem] items-center gap-x-2.5 text-xs" title={lane.because}>
          <span className="text-ink-2">{lane.label}</span>
          {lane.range && lane.measured ? <LaneBar lane={lane} /> : <span className={`truncate ${texts[lane.verdict]}`}>{lane.observed}</span>}
          <span className={`truncate text-right ${texts[lane.verdict]}`}>
            <span className="font-mono">{lane.reference}</span>
            <span className="sr-only">
              {" "}
              observed {lane.observed}, {verdictWords[lane.verdict]}
            </span>
            <span aria-hidden="true">{lane.verdict === "agrees" ? "" : lane.verdict === "strained" ? " ~" : " ✕"}</span>
          </span>
        </li>
      ))}
    </ul>
  );
}

/** How far on each side of the measured value a lane reaches: the same for every species, so that lanes compare. */
const reach: Readonly<Record<string, number>> = { sg: 0.7, birefringence: 0.05 };
const usualReach = 0.06;

function LaneBar({ lane: { property, range, measured, verdict } }: { lane: Lane }) {
  const half = reach[property] ?? usualReach;
  const { value, u } = measured!;
  const at = (x: number) => Math.min(99, Math.max(1, 50 + ((x - value) / half) * 50));
  const [low, high] = range!;
  const [left, right] = [at(low), at(high)];
  const whisker = [at(value - 2 * u), at(value + 2 * u)] as const;
  return (
    <svg aria-hidden="true" className="block h-3.5 w-full overflow-visible forced-color-adjust-none">
      <line x1="0" x2="100%" y1="7" y2="7" className="stroke-rule-2" />
      <rect x={`${left}%`} width={`${Math.max(1.2, right - left)}%`} y="4" height="6" rx="2" className={bars[verdict]} />
      <line x1={`${whisker[0]}%`} x2={`${whisker[1]}%`} y1="7" y2="7" strokeWidth="1.6" className={ticks[verdict]} />
      <line x1="50%" x2="50%" y1="1.5" y2="12.5" strokeWidth="1.8" className={ticks[verdict]} />
    </svg>
  );
}
