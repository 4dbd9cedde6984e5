import { Link } from "react-router";
import type { MapReading, Standing } from "#app/components/charts/species-map/species-map.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { formatInterval } from "#app/domain/format-interval.ts";
import type { SpeciesBox } from "#app/features/species/species-boxes.ts";
import { offsetWords } from "./offset-words.ts";

const standingWords: Readonly<Record<Standing, string>> = { chosen: "chosen", candidate: "candidate", near: "", open: "", contradicted: "ruled out by the readings" };

const standingRank: Readonly<Record<Standing, number>> = { chosen: 0, candidate: 0, near: 1, open: 1, contradicted: 2 };

type MapTableProps = { boxes: readonly SpeciesBox[]; unplaced: ReadonlyArray<{ id: string; name: string }>; standingOf: (id: string) => Standing; reading: MapReading; base: string };

/** What the map shows, in words: from the reading outwards, or by index where there is none. */
export function MapTable({ boxes, unplaced, standingOf, reading, base }: MapTableProps) {
  const hasReading = reading.index !== null || reading.sg !== null;
  // Of what holds the reading alike, what the other readings favour and what is common comes first.
  const rank = (id: string) => standingRank[standingOf(id)];
  const lines = boxes.map((box) => ({ ...box, ...offsetWords(box, reading) })).sort((a, b) => (hasReading ? a.distanceU - b.distanceU || rank(a.id) - rank(b.id) || b.weight - a.weight : a.index[0] - b.index[0]) || a.name.localeCompare(b.name, "en"));
  const near = lines.filter(({ isNear }) => isNear).length;
  return (
    <Card id="table" title="The same as a table" note={hasReading ? `from the reading outwards; ${near} within 2u` : "by index"}>
      <Table caption={hasReading ? "Species by their distance from the reading" : "Species by index and density"}>
        <thead>
          <tr>
            <HeaderCell>Species</HeaderCell>
            <HeaderCell isNumber>Index</HeaderCell>
            <HeaderCell isNumber>Density</HeaderCell>
          </tr>
        </thead>
        <tbody>
          {lines.map(({ id, name, index, sg, sentence, isNear }) => (
            <tr key={id} className={hasReading && isNear && standingOf(id) !== "contradicted" ? "bg-green-bg" : ""}>
              <th scope="row" className="border-t border-rule px-3 py-2 pl-4.5 text-left align-top font-normal">
                <Link to={`${base}/${id}`} className="text-ink underline decoration-rule-2 hover:text-tint hover:decoration-tint">
                  {name}
                </Link>
                {[hasReading ? sentence : "", standingWords[standingOf(id)]].some(Boolean) ? (
                  <span className={`block text-xs ${hasReading && isNear && standingOf(id) !== "contradicted" ? "font-medium text-green" : "text-ink-3"}`}>{[hasReading ? sentence : "", standingWords[standingOf(id)]].filter(Boolean).join("; ")}</span>
                ) : null}
              </th>
              <Cell isNumber>{formatInterval(index, 3)}</Cell>
              <Cell isNumber>{formatInterval(sg, 2)}</Cell>
            </tr>
          ))}
        </tbody>
      </Table>
      {unplaced.length > 0 ? <p className="border-t border-rule px-4.5 py-3 text-sm text-ink-3">Without an index or a density: {unplaced.map(({ name }) => name).join(", ")}.</p> : null}
    </Card>
  );
}
