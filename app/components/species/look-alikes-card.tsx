import { Card, CardBody } from "#app/components/ui/card.tsx";
import { CardSection } from "#app/components/ui/card-section.tsx";
import type { SpeciesSheet } from "#app/features/species/get-species.server.ts";
import { AlikeGroups } from "./alike-groups.tsx";
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
      <AlikeGroups groups={alike} base={base} />
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
