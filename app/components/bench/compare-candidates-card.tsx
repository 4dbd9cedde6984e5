import { Card, CardBody } from "#app/components/ui/card.tsx";
import type { BenchCandidate, Lane } from "#app/features/identification/bench-ranking.ts";

const tones = { agrees: "text-green", strained: "text-straw", contradicts: "text-red" } as const;

/** Two candidates property by property: what each is known to show, and which of them an observation speaks for. */
export function CompareCandidatesCard({ compared: [first, second] }: { compared: readonly BenchCandidate[] }) {
  if (!first || !second) return null;
  const rows = first.lanes.flatMap((lane, at) => (second.lanes[at]?.property === lane.property ? [{ lane, other: second.lanes[at] }] : []));
  return (
    <Card title={`${first.name} or ${second.name}`} note="what each observation speaks for">
      <CardBody className="overflow-x-auto">
        <table className="w-full border-collapse text-sm">
          <thead>
            <tr className="text-left text-xs text-ink-2">
              <th scope="col" className="py-1 pr-3 font-semibold">Observed</th>
              <th scope="col" className="py-1 pr-3 font-semibold">{first.name}</th>
              <th scope="col" className="py-1 pr-3 font-semibold">{second.name}</th>
              <th scope="col" className="py-1 font-semibold">Speaks for</th>
            </tr>
          </thead>
          <tbody>
            {rows.map(({ lane, other }, at) => (
              <tr key={`${lane.property}-${at}`} className="border-t border-rule align-top">
                <th scope="row" className="py-1.5 pr-3 text-left font-normal">
                  <span className="block text-xs text-ink-3">{lane.label}</span>
                  <span className="font-mono">{lane.observed}</span>
                </th>
                <Known lane={lane} />
                <Known lane={other} />
                <td className="py-1.5">{spokenFor(lane.logLikelihood - other.logLikelihood, first.name, second.name)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </CardBody>
    </Card>
  );
}

function Known({ lane: { reference, verdict } }: { lane: Lane }) {
  return (
    <td className="py-1.5 pr-3">
      <span className="block">{reference}</span>
      <span className={`text-xs font-medium ${tones[verdict]}`}>{verdict}</span>
    </td>
  );
}

/** Below a factor of 1.5 an observation does not choose. */
function spokenFor(difference: number, first: string, second: string): string {
  const factor = Math.exp(Math.abs(difference));
  if (factor < 1.5) return "neither";
  const times = factor > 1000 ? "over 1,000" : factor >= 10 ? String(Math.round(factor)) : factor.toFixed(1);
  return `${difference > 0 ? first : second}, ${times} times`;
}
