import { useState } from "react";
import { useIsHydrated } from "#app/components/layout/use-is-hydrated.ts";
import { Card } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import type { BenchCandidate, BenchRanking } from "#app/features/identification/bench-ranking.ts";
import { EvidenceLanes } from "./evidence-lanes.tsx";

/** What the readings leave possible, best first. It proposes; it never concludes. */
export function CandidatesCard({ ranking, prior = "prevalence", isWithTyped = false }: { ranking: BenchRanking; prior?: "prevalence" | "even"; /** The reading that is being typed is counted in. */ isWithTyped?: boolean }) {
  const { candidates, hasEvidence, speciesCount } = ranking;
  return (
    <Card title="Candidates" note={`of ${speciesCount}, ${prior === "even" ? "all weighing alike" : "by prevalence"}`} aside={<>{isWithTyped ? <Chip tone="blue">with what you type</Chip> : null}<Chip tone="tint">Table {ranking.tableVersion.slice(0, 8)}</Chip></>}>
      {hasEvidence ? (
        <div aria-live="polite" aria-atomic="false">
          <ol>
            {candidates.map((candidate) => (
              <CandidateItem key={candidate.speciesId} candidate={candidate} />
            ))}
          </ol>
          <div className="grid gap-2 px-4.5 pt-2 pb-4 text-sm text-ink-2">
            {candidates.length === 0 ? <p>No species of the table agrees with all of these readings. One of them may be wrong, or the stone is not in the table.</p> : null}
            {ranking.otherCount > 0 ? <p>{ranking.otherCount} more are possible and less likely.</p> : null}
            <p>Not in the table: {percent(ranking.unlisted)}.</p>
            <RuledOutList ranking={ranking} />
            {ranking.inseparable.map(({ names, settledBy }) => (
              <p key={names.join()}>
                <strong className="font-semibold text-ink">Not told apart by these readings: {names.join(", ")}.</strong> {settledBy}
              </p>
            ))}
            <Caution>
              These readings cannot tell natural{candidates[0] ? ` from synthetic ${candidates[0].name.toLowerCase()}` : " from synthetic"}, nor show treatment. That needs inclusions under magnification or a laboratory spectrum.
            </Caution>
          </div>
        </div>
      ) : (
        <p className="px-4.5 pb-4.5 text-ink-2">Nothing to rank yet. An index, a density or what the polariscope shows begins it; with script, already while you type.</p>
      )}
    </Card>
  );
}

function CandidateItem({ candidate: { name, probability, lanes } }: { candidate: BenchCandidate }) {
  return (
    <li className="border-t border-rule px-4.5 py-2.5">
      <div className="flex items-baseline gap-2.5">
        <h3>{name}</h3>
        <span className="ml-auto shrink-0 font-mono text-base font-medium whitespace-nowrap">{percent(probability)}</span>
      </div>
      <svg aria-hidden="true" className="my-1.5 block h-1.25 w-full overflow-hidden rounded-full">
        <rect width="100%" height="100%" className="fill-track" />
        <rect width={`${Math.max(0.6, probability * 100)}%`} height="100%" className="fill-tint" />
      </svg>
      <EvidenceLanes lanes={lanes} name={name} />
    </li>
  );
}

const mostShown = 3;

function RuledOutList({ ranking: { ruledOut, ruledOutCount } }: { ranking: BenchRanking }) {
  // Long, and seldom read: with script it is made when it is opened, not with every digit.
  const [isOpen, setIsOpen] = useState(false);
  const isHydrated = useIsHydrated();
  if (ruledOutCount === 0) return null;
  const reason = ({ name, because, readings }: (typeof ruledOut)[number]) => (
    <>
      {name}: {because}
      {readings.length > 0 ? ` (${readings.map(({ sequence }) => (sequence === null ? "what you type" : `reading ${sequence}`)).join(", ")})` : ""}.
    </>
  );
  return (
    <>
      <p>
        <strong className="font-semibold text-ink">{ruledOutCount} ruled out.</strong>{" "}
        {ruledOut.slice(0, mostShown).map((one) => (
          <span key={one.speciesId}>{reason(one)} </span>
        ))}
      </p>
      {ruledOut.length > mostShown ? (
        <details onToggle={({ currentTarget }) => setIsOpen(currentTarget.open)}>
          <summary className="text-link inline-flex min-h-6 items-center">Reasons for the others</summary>
          {isOpen || !isHydrated ? (
            <ul className="mt-1 grid max-h-72 gap-0.5 overflow-y-auto text-xs">
              {ruledOut.slice(mostShown).map((one) => (
                <li key={one.speciesId}>{reason(one)}</li>
              ))}
              {ruledOutCount > ruledOut.length ? <li>{ruledOutCount - ruledOut.length} less likely ones are ruled out as well.</li> : null}
            </ul>
          ) : null}
        </details>
      ) : null}
    </>
  );
}

/** Never 0 % or 100 %: the readings say what is likely, not what is certain. */
function percent(share: number): string {
  if (share > 0.999) return "> 99.9 %";
  if (share < 0.001) return "< 0.1 %";
  return `${(share * 100).toFixed(1)} %`;
}
