import { data } from "react-router";
import { loadSpeciesNames } from "#app/features/species/load-species-names.server.ts";
import type { Route } from "./+types/species-names";

/** Every name of the species table under its version, for the search in the browser; kept for good like the table. */
export function loader({ params }: Route.LoaderArgs) {
  const { version, species, names } = loadSpeciesNames();
  if (params.fileName !== `${version}.json`) throw data({ userMessage: "This list of names is not in use any more. Load the page again." }, { status: 404 });
  return Response.json({ version, species, names }, { headers: { "Cache-Control": "public, max-age=31536000, immutable" } });
}
