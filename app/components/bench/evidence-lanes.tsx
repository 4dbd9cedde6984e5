import { EvidenceLane } from "#app/components/charts/evidence-lane.tsx";
import { Icon } from "#app/components/ui/icon.tsx";
import type { Lane } from "#app/features/identification/bench-ranking.ts";

const texts = { agrees: "text-green", strained: "text-straw", contradicts: "text-red" } as const;
const icons = { agrees: "check", strained: "alert", contradicts: "cross" } as const;

/** A lane a property; what is seen and no number is said in words. */
export function EvidenceLanes({ lanes, name }: { lanes: readonly Lane[]; name: string }) {
  return (
    <ul aria-label={`Evidence for ${name}`} className="grid gap-y-0.5">
      {lanes.map((lane, at) => (
        <li key={`${lane.property}-${at}`} title={lane.because}>
          {lane.scale ? (
            <EvidenceLane label={lane.label} referenceText={lane.reference} observedText={lane.observed} verdict={lane.verdict} {...lane.scale} />
          ) : (
            <div className="grid grid-cols-[5.25rem_minmax(0,1fr)_5.75rem] items-center gap-x-2.5 text-xs leading-5">
              <span className="truncate text-ink-2">{lane.label}</span>
              <span className="truncate">
                {lane.observed}
                <span className="text-ink-3"> · {lane.reference}</span>
              </span>
              <span className={`flex items-center gap-1 font-medium ${texts[lane.verdict]}`}>
                <Icon name={icons[lane.verdict]} sizePx={12} />
                {lane.verdict}
              </span>
            </div>
          )}
        </li>
      ))}
    </ul>
  );
}
