import { eachFittingForm } from "#app/features/species/list-species.server.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { opticWords } from "#app/features/species/optic-words.ts";
import type { Interval } from "#app/gemmology/species/species-table.ts";
import { csvResponse } from "#app/web/csv-response.server.ts";
import { readSpeciesQuery } from "#app/web/species-query.ts";
import type { Route } from "./+types/list-csv";

const ends = (interval: Interval | null, decimals: number) => (interval ? interval.map((value) => value.toFixed(decimals)) : ["", ""]);

/** A line a form: constants belong to forms. */
export function loader({ url }: Route.LoaderArgs) {
  const { query } = readSpeciesQuery(url.searchParams);
  const rowById = new Map(loadSpeciesTable().rows.map((row) => [row.id, row]));
  function* lines() {
    for (const { node, form } of eachFittingForm(query)) {
      const row = rowById.get(form.id)!;
      yield [
        node.name,
        form.name,
        form.kind,
        opticWords([form]),
        ...ends(form.lowIndex ?? form.spotIndex, 3),
        ...ends(form.highIndex ?? form.spotIndex, 3),
        ...ends(form.birefringence, 3),
        ...ends(form.sg, 2),
        form.colours.join("; "),
        row.trade_names.join("; "),
        row.misleading_names.join("; "),
        row.sources.join("; "),
      ];
    }
  }
  return csvResponse({
    fileName: "species.csv",
    header: [
      "species", "form", "made by", "character and sign", "low index from", "low index to", "high index from", "high index to", "birefringence from", "birefringence to",
      "density from", "density to", "colours", "trade names", "misleading names", "sources",
    ],
    rows: lines(),
  });
}
