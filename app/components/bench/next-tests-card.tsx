import { Link } from "react-router";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { RampBar } from "#app/components/ui/ramp-bar.tsx";
import type { NextTests } from "#app/features/identification/next-tests-for-stone.ts";

/** Which test would tell most about this stone, and which would but must not be made. */
export function NextTestsCard({ next: { recommended, vetoed }, hrefOf }: { next: NextTests; hrefOf: (kind: NextTests["recommended"][number]["kind"]) => string }) {
  if (recommended.length === 0 && vetoed.length === 0) return null;
  const most = Math.max(1, ...recommended.map(({ bits }) => bits));
  return (
    <Card title="What to test next" note="by what it would settle">
      <CardBody className="grid gap-3">
        {recommended.length > 0 ? (
          <ol className="grid gap-2.5">
            {recommended.map(({ testId, name, bits, settles, kind, isRepeat }) => (
              <li key={testId} className="grid grid-cols-[minmax(0,1fr)_7rem_4.5rem] items-center gap-x-3 border-t border-rule pt-2.5 first:border-t-0 first:pt-0">
                <span>
                  <Link to={hrefOf(kind)} preventScrollReset className="font-semibold text-ink decoration-rule-2 hover:text-tint">
                    {name}
                  </Link>
                  <span className="block text-sm text-ink-2">
                    {isRepeat ? "again, since it was not a good reading; " : ""}
                    {settles}
                  </span>
                </span>
                <RampBar label={`Expected of ${name}`} share={bits / most} valueText={`${bits.toFixed(2)} bit`} />
                <span className="text-right font-mono text-sm">{bits.toFixed(2)} bit</span>
              </li>
            ))}
          </ol>
        ) : null}
        {vetoed.length > 0 ? (
          <ul className="grid gap-1 text-sm text-ink-2">
            {vetoed.map(({ testId, name, because }) => (
              <li key={testId}>
                <strong className="font-semibold text-ink">Not {name.toLowerCase()}:</strong> {because}.
              </li>
            ))}
          </ul>
        ) : null}
      </CardBody>
    </Card>
  );
}
