import { Form, Link } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { observationKindNames, testGroups, type ObservationKind } from "#app/domain/reading.ts";

/** In place of the candidates, while an observer reads without them. */
export function HiddenCandidatesCard({ planLeft, showHref }: { planLeft: readonly ObservationKind[]; showHref: string }) {
  return (
    <Card title="Candidates" note="hidden while you read">
      <CardBody className="grid gap-3">
        <p className="text-ink-2">Readings made now are marked as made without candidates in view.</p>
        {planLeft.length > 0 ? <p>Still to record: {planLeft.map((kind) => observationKindNames[kind].toLowerCase()).join(", ")}. Then the candidates show.</p> : null}
        <p>
          <Link to={showHref} preventScrollReset className="text-link">
            {planLeft.length > 0 ? "Show the candidates all the same" : "Show the candidates"}
          </Link>
        </p>
      </CardBody>
    </Card>
  );
}

/** Hides the candidates until what an observer plans is recorded: a form of its own, so that it works without script. */
export function HideCandidatesForm({ test, lastSequence }: { test: ObservationKind; lastSequence: number }) {
  return (
    <details className="no-print rounded-lg border border-rule bg-sheet px-4.5 py-2.5">
      <summary className="flex min-h-6 cursor-pointer items-center text-sm text-tint pointer-coarse:min-h-11">Hide the candidates while reading</summary>
      <Form method="get" preventScrollReset className="mt-2 grid gap-3">
        <input type="hidden" name="test" value={test} />
        <input type="hidden" name="candidates" value="hidden" />
        <input type="hidden" name="since" value={lastSequence} />
        <fieldset>
          <legend className="mb-1 text-xs font-semibold text-ink-2">Until these are recorded; none ticked hides them until you show them</legend>
          <div className="grid grid-cols-2 gap-x-4">
            {testGroups
              .flatMap(({ kinds }) => kinds)
              .map((kind) => (
                <label key={kind} className="flex min-h-7 cursor-pointer items-center gap-2 text-sm pointer-coarse:min-h-11">
                  <input type="checkbox" name="plan" value={kind} className="size-4.5 shrink-0 accent-tint" />
                  {observationKindNames[kind]}
                </label>
              ))}
          </div>
        </fieldset>
        <div>
          <Button look="quiet">Hide them</Button>
        </div>
      </Form>
    </details>
  );
}
