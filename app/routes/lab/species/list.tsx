import { Form, Link, useNavigate } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { PropertyFilters } from "#app/components/species/property-filters.tsx";
import { FoundBy, SpeciesSearchBox } from "#app/components/species/species-search.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { Pager } from "#app/components/ui/pager.tsx";
import { Cell, HeaderCell, SortHeaderCell, Table } from "#app/components/ui/table.tsx";
import { formatInterval } from "#app/domain/format-interval.ts";
import { listSpecies, type SpeciesLine } from "#app/features/species/list-species.server.ts";
import { kindNames } from "#app/features/species/species-filter.ts";
import { readSpeciesQuery } from "#app/web/species-query.ts";
import type { Route } from "./+types/list";

export function loader({ url }: Route.LoaderArgs) {
  const { query, typed, errors } = readSpeciesQuery(url.searchParams);
  return { ...listSpecies(query), typed, errors, sort: query.sort };
}

export const meta: Route.MetaFunction = () => [{ title: "Species · Isogyre" }];

export default function SpeciesRoute({ loaderData, params }: Route.ComponentProps) {
  const { species, total, tableSize, earlier, later, namesVersion, typed, errors, sort } = loaderData;
  const base = `/lab/${params.labSlug}/species`;
  const navigate = useNavigate();
  const asked = new URLSearchParams(Object.entries(typed).filter(([, value]) => value !== ""));
  const isFiltered = asked.size > 0;
  return (
    <>
      <PageHeader
        title="Species"
        note={isFiltered ? `${total} of ${tableSize} species${sort === "found" ? `, what “${typed.name}” fits best first` : ""}.` : `${tableSize} species, by every name they go under, the misleading ones too.`}
        actions={
          <>
            <a href={`${base}.csv${isFiltered ? `?${asked}` : ""}`} className="px-1 text-tint">
              Export CSV
            </a>
            <LinkButton to={`${base}/compare`}>Compare</LinkButton>
            <LinkButton to={`${base}/map`}>Index and density map</LinkButton>
          </>
        }
      />
      <Form className="no-print mb-3 flex flex-wrap items-start gap-2.5" role="search" aria-label="Find a species" key={asked.toString()}>
        <SpeciesSearchBox
          label="Any name"
          name="name"
          defaultValue={typed.name}
          namesVersion={namesVersion}
          className="w-64"
          onChoose={({ speciesId, by }) => void navigate(`${base}/${speciesId}${by.formId ? `?form=${by.formId}` : ""}`)}
        />
        <PropertyFilters typed={typed} errors={errors} />
        <div className="mt-5.5 flex items-center gap-2.5">
          <Button look="quiet">Show</Button>
          {isFiltered ? (
            <Link to={base} className="px-1 text-ink-2">
              Clear
            </Link>
          ) : null}
        </div>
      </Form>
      <Card>
        {species.length === 0 ? (
          <EmptyState title="No species answers" action={<LinkButton to={base}>Show all species</LinkButton>}>
            {typed.name ? `No name in the table is like “${typed.name}” with these properties. ` : "No form of any species has all of these properties. "}
            Ask for less, or for a wider range: a reading is uncertain by itself.
          </EmptyState>
        ) : (
          <>
            <Table caption="Species">
              <thead>
                <tr>
                  <HeaderCell className="w-10 !pr-0">
                    <span className="sr-only">Compare</span>
                  </HeaderCell>
                  <SortHeaderCell sortKey="name" defaultDirection="asc">
                    Species
                  </SortHeaderCell>
                  <SortHeaderCell sortKey="index" defaultDirection="asc" isNumber>
                    Index
                  </SortHeaderCell>
                  <SortHeaderCell sortKey="birefringence" defaultDirection="asc" isNumber>
                    Birefringence
                  </SortHeaderCell>
                  <SortHeaderCell sortKey="density" defaultDirection="asc" isNumber>
                    Density
                  </SortHeaderCell>
                  <HeaderCell>Character and sign</HeaderCell>
                  <HeaderCell hideBelow="xl">Colours</HeaderCell>
                  <HeaderCell hideBelow="lg">Nature</HeaderCell>
                </tr>
              </thead>
              <tbody>
                {species.map((line) => (
                  <SpeciesRow key={line.id} line={line} base={base} />
                ))}
              </tbody>
            </Table>
            <form id="compare" action={`${base}/compare`} className="no-print flex flex-wrap items-center gap-3 border-t border-rule px-4.5 py-3">
              <Button look="quiet">Compare the ticked</Button>
              <p className="text-sm text-ink-3">Up to four side by side. Index for 589.3 nm, density relative to water at 4 °C.</p>
            </form>
          </>
        )}
      </Card>
      <Pager before={earlier} after={later} />
    </>
  );
}

const mostForms = 3;
const mostColours = 5;

function SpeciesRow({ line: { id, name, forms, kinds, optics, span, colours, foundBy }, base }: { line: SpeciesLine; base: string }) {
  const others = forms.filter((form) => form.name !== name);
  return (
    <tr>
      <Cell className="!pr-0">
        <label className="-m-1.5 flex min-h-6 min-w-6 items-center justify-center p-1.5 pointer-coarse:min-h-11">
          <input type="checkbox" form="compare" name="species" value={id} className="size-4 accent-tint" />
          <span className="sr-only">Compare {name}</span>
        </label>
      </Cell>
      <th scope="row" className="min-w-56 border-t border-rule px-3 py-2 align-top font-normal">
        <Link to={`${base}/${id}${foundBy?.formId ? `?form=${foundBy.formId}` : ""}`} className="font-serif text-[15px] text-ink underline decoration-rule-2 hover:text-tint hover:decoration-tint">
          {name}
        </Link>
        {foundBy ? (
          <span className="block">
            <FoundBy by={foundBy} />
          </span>
        ) : others.length > 0 ? (
          <span className="block text-xs text-ink-3">
            {others
              .slice(0, mostForms)
              .map((form) => form.name)
              .join(", ")}
            {others.length > mostForms ? ` and ${others.length - mostForms} more` : ""}
          </span>
        ) : null}
      </th>
      <Cell isNumber>{span.index ? formatInterval(span.index, 3) : <NoValue />}</Cell>
      <Cell isNumber>{span.birefringence ? span.birefringence[1] === 0 ? <span className="text-ink-3">none</span> : formatInterval(span.birefringence, 3) : <NoValue />}</Cell>
      <Cell isNumber>{span.sg ? formatInterval(span.sg, 2) : <NoValue />}</Cell>
      <Cell className="min-w-36">{optics}</Cell>
      <Cell hideBelow="xl" className="text-ink-2">
        {colours.length > mostColours + 1 ? `${colours.slice(0, mostColours).join(", ")} and ${colours.length - mostColours} more` : colours.join(", ")}
      </Cell>
      <Cell hideBelow="lg" className="text-ink-2">
        {kinds.map((kind) => kindNames[kind]).join(", ")}
      </Cell>
    </tr>
  );
}

function NoValue() {
  return (
    <span className="text-ink-3">
      <span aria-hidden="true">–</span>
      <span className="sr-only">no value</span>
    </span>
  );
}
