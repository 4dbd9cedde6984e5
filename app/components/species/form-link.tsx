import { Link } from "react-router";
import type { FormLink } from "#app/features/species/get-species.server.ts";

/** Leads to a form on the page of its species. */
export function FormAnchor({ base, link: { speciesId, formId, name } }: { base: string; link: FormLink }) {
  return (
    <Link to={`${base}/${speciesId}?form=${formId}`} className="text-link">
      {name}
    </Link>
  );
}
