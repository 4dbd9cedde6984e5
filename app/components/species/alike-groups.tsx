import { CardSection } from "#app/components/ui/card-section.tsx";
import type { FormLink } from "#app/features/species/get-species.server.ts";
import { FormAnchor } from "./form-link.tsx";

type AlikeGroup = Readonly<{ shared: string; others?: readonly FormLink[]; bench: readonly string[]; laboratory: readonly string[] }>;

/** Groups that bench constants leave together, and what separates them. */
export function AlikeGroups({ groups, base }: { groups: readonly AlikeGroup[]; base: string }) {
  if (groups.length === 0) return null;
  return (
    <CardSection title="Constants do not separate" headingLevel={3}>
      <ul className="grid gap-4">
        {groups.map(({ shared, others = [], bench, laboratory }) => (
          <li key={shared} className="border-t border-rule pt-3 first:border-t-0 first:pt-0">
            <p className="text-ink-2">{shared}.</p>
            {others.length > 0 ? (
              <p className="mt-1">
                {others.map((link, at) => (
                  <span key={link.formId}>
                    {at > 0 ? ", " : ""}
                    <FormAnchor base={base} link={link} />
                  </span>
                ))}
              </p>
            ) : null}
            <dl className="mt-2 grid gap-y-1.5">
              <Ways label="At the bench" ways={bench} />
              <Ways label="In a laboratory" ways={laboratory} />
            </dl>
          </li>
        ))}
      </ul>
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
