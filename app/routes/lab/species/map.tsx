import { useMemo } from "react";
import { Link } from "react-router";
import { readMapView, viewAround, wholeView, type MapView } from "#app/components/charts/species-map/map-view.ts";
import type { Standing } from "#app/components/charts/species-map/species-map.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { MapCard } from "#app/components/species/map-card.tsx";
import { MapReadingForm } from "#app/components/species/map-reading-form.tsx";
import { MapTable } from "#app/components/species/map-table.tsx";
import { offsetWords } from "#app/components/species/offset-words.ts";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { formatWithUncertainty } from "#app/domain/format-uncertainty.ts";
import type { Measured } from "#app/features/identification/bench-ranking.ts";
import { getStonePlace } from "#app/features/identification/get-stone-place.server.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { speciesBoxes, type SpeciesBox } from "#app/features/species/species-boxes.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import { placedUncertainty, readPlacedReading } from "#app/web/species-map-query.ts";
import type { Route } from "./+types/map";

const keptNames = ["stone", "show", "at", "n", "nU", "d", "dU"] as const;

export async function loader({ context, url }: Route.LoaderArgs) {
  const { searchParams } = url;
  const stoneCode = searchParams.get("stone")?.slice(0, 40);
  const stone = stoneCode ? await orResponse(getStonePlace(context.get(labContext), { stoneCode, isExaminationAsked: searchParams.get("show") === "examination" })) : null;
  const { boxes, unplaced } = speciesBoxes(loadSpeciesTable().table);
  const placed = readPlacedReading(searchParams);
  // What is typed comes before what was recorded.
  const reading = { index: placed.index ?? measured(stone?.seen?.index, placedUncertainty.index), sg: placed.sg ?? measured(stone?.seen?.density, placedUncertainty.sg) };
  const asked = (searchParams.get("at") ?? "").split(",").slice(0, 8);
  const chosen = boxes.filter(({ id }) => asked.includes(id));
  return {
    boxes,
    unplaced,
    reading,
    stone,
    typed: placed.typed,
    errors: placed.errors,
    chosenIds: chosen.map(({ id }) => id),
    view: readMapView({ x: searchParams.get("x"), y: searchParams.get("y") }) ?? startView(reading, chosen),
    kept: Object.fromEntries(keptNames.flatMap((name) => (searchParams.get(name) ? [[name, searchParams.get(name)!.slice(0, 200)]] : []))),
  };
}

/** A reading without an uncertainty of its own gets the usual one: an ellipse of nothing would promise too much. */
const measured = (reading: Measured | null | undefined, usualU: number): Measured | null => (reading ? { value: reading.value, u: reading.u || usualU } : null);

/** Around the reading; else around the chosen species; else everything. */
function startView({ index, sg }: { index: { value: number } | null; sg: { value: number } | null }, chosen: readonly SpeciesBox[]): MapView {
  if (index || sg) return viewAround({ index: index?.value ?? null, sg: sg?.value ?? null });
  if (chosen.length === 0) return wholeView;
  const [indices, densities] = [chosen.flatMap((box) => box.index), chosen.flatMap((box) => box.sg)];
  const wide = (values: readonly number[], margin: number): [number, number] => [Math.min(...values) - margin, Math.max(...values) + margin];
  const [[indexMin, indexMax], [sgMin, sgMax]] = [wide(indices, 0.1), wide(densities, 0.6)];
  return readMapView({ x: `${indexMin.toFixed(4)}~${indexMax.toFixed(4)}`, y: `${sgMin.toFixed(3)}~${sgMax.toFixed(3)}` }) ?? wholeView;
}

export const meta: Route.MetaFunction = () => [{ title: "Index and density map · Isogyre" }];

export default function SpeciesMapRoute({ loaderData, params }: Route.ComponentProps) {
  const { boxes, unplaced, reading, stone, typed, errors, chosenIds, view, kept } = loaderData;
  const lab = `/lab/${params.labSlug}`;
  const base = `${lab}/species`;
  const isTyped = Object.values(typed).some(Boolean);
  const seen = isTyped ? null : stone?.seen;
  const standingOf = useMemo(() => {
    const standings = new Map<string, Standing>();
    if (reading.index || reading.sg) for (const box of boxes) if (offsetWords(box, reading).isNear) standings.set(box.id, "near");
    for (const id of seen?.contradictedIds ?? []) standings.set(id, "contradicted");
    for (const id of seen?.candidateIds ?? []) standings.set(id, "candidate");
    for (const id of chosenIds) standings.set(id, "chosen");
    return (id: string): Standing => standings.get(id) ?? "open";
  }, [boxes, reading, chosenIds, seen]);
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={base} className="text-ink-3">
            Species
          </Link>
        }
        title="Index and density map"
        note={stone ? `With ${stone.code}, ${stone.description}${isTyped ? "; the values typed below stand in for its own" : ""}.` : "Every species as a box of what it spans; a reading as an ellipse of two standard uncertainties."}
        meta={[
          { name: "Index", value: reading.index ? <span className="font-mono">{formatWithUncertainty(reading.index.value, reading.index.u)}</span> : null },
          { name: "Density", value: reading.sg ? <span className="font-mono">{formatWithUncertainty(reading.sg.value, reading.sg.u)}</span> : null },
        ]}
        actions={
          <>
            {chosenIds.length > 1 ? <LinkButton to={`${base}/compare?species=${chosenIds.slice(0, 4).join(",")}`}>Compare them</LinkButton> : null}
            {stone ? <LinkButton to={`${lab}/stones/${stone.code}${kept.show ? `?show=${kept.show}` : ""}`}>Back to the bench</LinkButton> : null}
            <a href="#table" className="px-1 text-tint">
              To the table
            </a>
          </>
        }
      />
      {stone && !stone.seen ? <Caution className="mb-3">You are, or may be, the one who checks this stone: what was read before stays hidden here, as it does on its page.</Caution> : null}
      {stone?.seen && !stone.seen.index && !stone.seen.density ? <Caution className="mb-3">No index and no density have been read from this stone yet.</Caution> : null}
      <MapReadingForm typed={typed} errors={errors} placeholders={{ nU: String(placedUncertainty.index), dU: String(placedUncertainty.sg) }} clearTo={isTyped ? (stone ? `?stone=${stone.code}` : base + "/map") : null} />
      <div className="grid items-start gap-5 xl:grid-cols-[minmax(0,1fr)_28rem]">
        {/* A new question draws a new map; moving in it does not ask again. */}
        <MapCard key={JSON.stringify([reading, chosenIds, view])} boxes={boxes} standingOf={standingOf} reading={reading} startView={view} base={base} kept={kept} />
        <MapTable boxes={boxes} unplaced={unplaced} standingOf={standingOf} reading={reading} base={base} />
      </div>
    </>
  );
}
