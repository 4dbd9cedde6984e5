import { Link } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { ConstantsCard } from "#app/components/species/constants-card.tsx";
import { FormsCard } from "#app/components/species/forms-card.tsx";
import { HarmCard } from "#app/components/species/harm-card.tsx";
import { LightCard } from "#app/components/species/light-card.tsx";
import { LookAlikesCard } from "#app/components/species/look-alikes-card.tsx";
import { NamesCard } from "#app/components/species/names-card.tsx";
import { SeenCard } from "#app/components/species/seen-card.tsx";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import { kindNames } from "#app/features/species/species-filter.ts";
import { getSpecies } from "#app/features/species/get-species.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/detail";

export async function loader({ params, url }: Route.LoaderArgs) {
  return orResponse((async () => getSpecies({ speciesId: params.speciesId, formId: url.searchParams.get("form") }))());
}

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: `${loaderData ? loaderData.name : "Species"} · Isogyre` }];

export default function OneSpeciesRoute({ loaderData, params }: Route.ComponentProps) {
  const { id, name, forms, form, theyShow, itShows, alike, avoid, notThis, tableVersion } = loaderData;
  const base = `/lab/${params.labSlug}/species`;
  const isOneOfSeveral = forms.length > 1;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={base} className="text-ink-3">
            Species
          </Link>
        }
        title={name}
        note={isOneOfSeveral ? `${forms.length} forms; below, ${form.name}.` : form.name === name ? undefined : form.name}
        meta={[
          { name: "Formula", value: form.formula ? <span className="font-mono">{form.formula}</span> : null },
          { name: "System", value: form.system },
          { name: "Family", value: form.family === name.toLowerCase() ? null : form.family },
          { name: "Table", value: <span className="font-mono">{tableVersion}</span> },
        ]}
        actions={
          <>
            <Chip tone={form.kind === "natural" || form.kind === "organic" || form.kind === "rock" ? "green" : "straw"}>{kindNames[form.kind]}</Chip>
            <LinkButton to={`${base}/compare?species=${isOneOfSeveral ? `${id}.${form.id}` : id}`}>Compare</LinkButton>
            <LinkButton to={`${base}/map?at=${id}`}>On the map</LinkButton>
          </>
        }
      />
      <div className="grid items-start gap-5 xl:grid-cols-[minmax(0,1fr)_30.75rem]">
        <div className="grid min-w-0 gap-5">
          {isOneOfSeveral ? <FormsCard forms={forms} shownId={form.id} base={`${base}/${id}`} /> : null}
          <ConstantsCard constants={form.constants} title={isOneOfSeveral ? `Constants of ${form.name}` : "Constants"} />
          <LightCard light={form.light} />
          <SeenCard form={form} />
        </div>
        <div className="grid min-w-0 gap-5">
          <LookAlikesCard theyShow={theyShow} itShows={itShows} alike={alike} base={base} />
          <HarmCard harm={form.harm} cautions={form.cautions} kind={form.kind} />
          <NamesCard avoid={avoid} notThis={notThis} form={form} base={base} />
        </div>
      </div>
    </>
  );
}
