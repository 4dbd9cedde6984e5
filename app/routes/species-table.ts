import { data } from "react-router";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import type { Route } from "./+types/species-table";

/** The compact species table under its version: the version names the content, so a browser keeps it for good. */
export function loader({ params }: Route.LoaderArgs) {
  const { table } = loadSpeciesTable();
  if (params.fileName !== `${table.version}.json`) throw data({ userMessage: "This species table is not in use any more. Load the page again." }, { status: 404 });
  return Response.json(table, { headers: { "Cache-Control": "public, max-age=31536000, immutable" } });
}
