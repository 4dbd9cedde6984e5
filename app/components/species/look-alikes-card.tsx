import { Card, CardBody } from "#app/components/ui/card.tsx";
import { CardSection } from "#app/components/ui/card-section.tsx";
import type { SpeciesSheet } from "#app/features/species/get-species.server.ts";
import { FormAnchor } from "./form-link.tsx";

/** What it is taken for, and what separates them at the bench or only in a laboratory. */
export function LookAlikesCard({ theyShow, itShows, alike, base }: Pick<SpeciesSheet, "theyShow" | "itShows" | "alike"> & { base: string }) {
  if (theyShow.length + itShows.length + alike.length === 0) {
    return (
      <Card title="Look-alikes">
        <CardBody>
          <p className="text-ink-2">The table names nothing that is easily taken for it. The index and density map shows what lies near.</p>
        </CardBody>
      </Card>
    );
  }
  return (
    <Card title="Look-alikes" note="and what separates them">
      <Separations title="What they show" separations={theyShow} base={base} />
      <Separations title="What it shows against others" separations={itShows} base={base} />
      {alike.map(({ shared, others, bench, laboratory }) => (
        <CardSection key={shared} title="Constants do not separate" headingLevel={3} intro={shared}>
          <p>
            {others.map((link, at) => (
              <span key={link.formId}>
                {at > 0 ? ", " : ""}
                <FormAnchor base={base} link={link} />
              </span>
            ))}
          </p>
          <dl className="mt-2 grid gap-y-1.5">
            <Ways label="At the bench" ways={bench} />
            <Ways label="In a laboratory" ways={laboratory} />
          </dl>
        </CardSection>
      ))}
    </Card>
  );
}

function Separations({ title, separations, base }: { title: string; separations: SpeciesSheet["theyShow"]; base: string }) {
  if (separations.length === 0) return null;
  return (
    <CardSection title={title} headingLevel={3}>
      <dl className="grid gap-y-2">
        {separations.map(({ by, ...link }) => (
          <div key={link.formId} className="grid grid-cols-[minmax(0,2fr)_minmax(0,3fr)] gap-x-4">
            <dt>
              <FormAnchor base={base} link={link} />
            </dt>
            <dd className="text-ink-2">{by}</dd>
          </div>
        ))}
      </dl>
    </CardSection>
  );
}

function Ways({ label, ways }: { label: string; ways: readonly string[] }) {
  if (ways.length === 0) return null;
  return (
    <div className="grid grid-cols-[7.5rem_minmax(0,1fr)] gap-x-4">
      <dt className="text-ink-3">{label}</dt>
      <dd>
        <ul className="grid gap-0.5">
          {ways.map((way) => (
            <li key={way}>{way}</li>
          ))}
        </ul>
      </dd>
    </div>
  );
}
