import { Form, Link, redirect, useNavigate } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { AlikeGroups } from "#app/components/species/alike-groups.tsx";
import { ComparisonTable } from "#app/components/species/comparison-table.tsx";
import { FormAnchor } from "#app/components/species/form-link.tsx";
import { SpeciesSearchBox } from "#app/components/species/species-search.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { CardSection } from "#app/components/ui/card-section.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { findSpeciesRef, getComparison } from "#app/features/species/get-comparison.server.ts";
import { formatSpeciesRef, mostCompared, parseSpeciesRef } from "#app/features/species/species-ref.ts";
import type { Route } from "./+types/compare";

const addressOf = (path: string, refs: readonly string[]) => (refs.length > 0 ? `${path}?species=${refs.join(",")}` : path);

/** `?species=a,b` is the page; `?species=a&species=b` of ticked boxes and `&add=words` of the form lead to it. */
export function loader({ url }: Route.LoaderArgs) {
  const given = url.searchParams.getAll("species");
  const refs = given.flatMap((one) => one.split(",")).slice(0, 50).flatMap((text) => parseSpeciesRef(text) ?? []);
  const add = (url.searchParams.get("add") ?? "").trim().slice(0, 60);
  const added = add === "" ? undefined : findSpeciesRef(add);
  const comparison = getComparison(added ? [...refs, added] : refs);
  const address = addressOf(url.pathname, comparison.columns.map(({ ref }) => ref));
  const leftOut = Math.max(0, new Set(refs.map(formatSpeciesRef)).size - comparison.columns.length);
  if (added || (given.length > 1 && leftOut === 0)) throw redirect(address);
  return { ...comparison, notFound: add, leftOut };
}

export const meta: Route.MetaFunction = () => [{ title: "Compare species · Isogyre" }];

export default function CompareRoute({ loaderData, params }: Route.ComponentProps) {
  const { columns, rows, separations, alike, namesVersion, notFound, leftOut } = loaderData;
  const base = `/lab/${params.labSlug}/species`;
  const path = `${base}/compare`;
  const navigate = useNavigate();
  const refs = columns.map(({ ref }) => ref);
  const isFull = columns.length >= mostCompared;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={base} className="text-ink-3">
            Species
          </Link>
        }
        title="Compare species"
        note={columns.length > 1 ? "Where it says apart, no value can belong to two of them." : `Up to ${mostCompared} side by side.`}
        actions={columns.length > 0 ? <LinkButton to={`${base}/map?at=${columns.map(({ speciesId }) => speciesId).join(",")}`}>On the map</LinkButton> : undefined}
      />
      {isFull ? (
        <p className="no-print mb-3 text-ink-2">Four stand side by side: take one away to add another.</p>
      ) : (
        <Form className="no-print mb-3 flex flex-wrap items-end gap-2.5" role="search" aria-label="Add a species" key={refs.join()}>
          {refs.length > 0 ? <input type="hidden" name="species" value={refs.join(",")} /> : null}
          <SpeciesSearchBox
            label={columns.length === 0 ? "The first species" : "Add a species, by any name"}
            name="add"
            defaultValue={notFound}
            namesVersion={namesVersion}
            className="w-72"
            onChoose={({ speciesId, by }) => {
              const formId = by.kind === "species" || by.kind === "family" ? null : by.formId;
              void navigate(addressOf(path, [...new Set([...refs, formatSpeciesRef({ speciesId, formId })])]), { preventScrollReset: true });
            }}
          />
          <Button look="quiet">Add</Button>
        </Form>
      )}
      {notFound ? (
        <p role="alert" className="mb-3 font-medium text-red">
          No species goes by a name like “{notFound}”.
        </p>
      ) : null}
      {leftOut > 0 ? <Caution className="mb-3">{leftOut === 1 ? "One species was" : `${leftOut} species were`} left out: not in the table, or more than four.</Caution> : null}
      {columns.length === 0 ? (
        <Card>
          <EmptyState title="Nothing to compare yet" action={<LinkButton to={base}>Choose from the list</LinkButton>}>
            Name a species above, or tick up to four in the list. A form such as ruby can stand beside a whole species such as spinel.
          </EmptyState>
        </Card>
      ) : (
        <div className="grid gap-5">
          <Card>
            <ComparisonTable columns={columns} rows={rows} base={base} hrefWithout={(ref) => addressOf(path, refs.filter((one) => one !== ref))} />
          </Card>
          {separations.length > 0 || alike.length > 0 ? (
            <Card title="What separates them">
              {separations.length > 0 ? (
                <CardSection headingLevel={3}>
                  <ul className="grid gap-2">
                    {separations.map(({ from, other, by }) => (
                      <li key={`${from.formId}-${other.formId}`}>
                        <FormAnchor base={base} link={other} /> <span className="text-ink-3">against</span> <FormAnchor base={base} link={from} />: <span className="text-ink-2">{by}</span>
                      </li>
                    ))}
                  </ul>
                </CardSection>
              ) : null}
              <AlikeGroups groups={alike} base={base} />
              <CardBody className="border-t border-rule">
                <p className="text-sm text-ink-2">Constants never tell natural from synthetic, nor treated from untreated.</p>
              </CardBody>
            </Card>
          ) : null}
        </div>
      )}
    </>
  );
}
