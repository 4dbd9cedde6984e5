import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import type { NatureOfStone } from "#app/features/identification/nature-of-stone.ts";

/** Nature and treatment, each a question of its own: what speaks for an answer, what says nothing, what no bench decides. */
export function NatureCard({ nature: { findings, silent, conflicts, speciesName, beyondBench, referral } }: { nature: NatureOfStone }) {
  return (
    <Card title="Nature and treatment" note="from what was seen, never from constants">
      <CardBody className="grid gap-3 text-sm">
        {findings.length > 0 ? (
          <ul className="grid gap-2">
            {findings.map(({ feature, question, answer, process, strength }) => (
              <li key={`${feature} ${question} ${answer}`} className="flex flex-wrap items-baseline gap-x-2">
                <Chip tone={strength === "positive" ? "green" : "straw"}>{strength === "positive" ? "positive" : "indication"}</Chip>
                <span>
                  <strong className="font-semibold">{feature}</strong>: {answer}
                  {process ? `, ${process}` : ""}
                </span>
              </li>
            ))}
          </ul>
        ) : (
          <p className="text-ink-2">Nothing that was written down speaks for natural, synthetic or treated.</p>
        )}
        {conflicts.map((conflict) => (
          <Caution key={conflict}>{conflict}</Caution>
        ))}
        {silent.map(({ feature, saysNothingOf }) => (
          <p key={feature} className="text-ink-2">
            {feature[0]!.toUpperCase() + feature.slice(1)} says nothing of {saysNothingOf}.
          </p>
        ))}
        {beyondBench.length > 0 ? (
          <p>
            <strong className="font-semibold">Not determinable at a bench for {speciesName?.toLowerCase()}:</strong> {beyondBench.join("; ")}.
          </p>
        ) : null}
        {referral.length > 0 ? <p>Consider an outside laboratory, where the client agrees: {referral.join("; ")}.</p> : null}
      </CardBody>
    </Card>
  );
}
