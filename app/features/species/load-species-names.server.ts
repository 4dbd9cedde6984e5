import { createHash } from "node:crypto";
import misleadingNames from "#fixtures/species/misleading-names.json" with { type: "json" };
import type { MisleadingName } from "#app/gemmology/species/species-row.ts";
import { loadSpeciesTable } from "./load-species-table.server.ts";
import { createSpeciesSearch, foldName, type SpeciesSearch } from "./search-species-names.ts";
import type { SpeciesName, SpeciesNames } from "./species-names.ts";

export type LoadedNames = SpeciesNames & Readonly<{ search: SpeciesSearch; misleading: readonly MisleadingName[] }>;
let loaded: LoadedNames | undefined;

/** Every name of the species table, gathered once a process. @throws Error when a misleading name means a row that is not there */
export function loadSpeciesNames(): LoadedNames {
  if (loaded) return loaded;
  const { table, rows } = loadSpeciesTable();
  const rowById = new Map(rows.map((row) => [row.id, row]));
  const nodeOfRow = new Map(table.nodes.flatMap(({ id, forms }) => forms.map((form) => [form.id, id] as const)));
  const nodeOf = (rowId: string) => {
    const nodeId = nodeOfRow.get(rowId);
    if (!nodeId) throw new Error(`a misleading name speaks of a row that is not there: ${rowId}`);
    return nodeId;
  };
  const names: SpeciesName[] = table.nodes.flatMap(({ id, name, forms }) => {
    const formRows = forms.map((form) => rowById.get(form.id)!);
    const families = [...new Set(formRows.map(({ group }) => group.replaceAll("-", " ")))];
    return [
      { name, kind: "species" as const, speciesId: id, formId: null },
      ...formRows.flatMap((row) => [{ name: row.name, kind: "form" as const, speciesId: id, formId: row.id }, ...row.trade_names.map((text) => ({ ...nameAndNote(text), kind: "trade" as const, speciesId: id, formId: row.id }))]),
      ...families.map((family) => ({ name: capital(family), kind: "family" as const, speciesId: id, formId: null })),
    ];
  });
  const misleading = misleadingNames as MisleadingName[];
  for (const { name, means, claims, note } of misleading) {
    // "Paraiba" misleads where it is used for another stone; what rightly bears the name is found by it first.
    for (const rowId of claims) {
      const { name: formName, trade_names: tradeNames } = rowById.get(rowId) ?? { name: "", trade_names: [] };
      if ([formName, ...tradeNames].some((rightful) => foldName(rightful).startsWith(foldName(name)))) names.push({ name, kind: "trade", speciesId: nodeOf(rowId), formId: rowId });
    }
    names.push(...means.map((rowId) => ({ name, kind: "misleading" as const, speciesId: nodeOf(rowId), formId: rowId, ...(note ? { note } : {}) })));
  }
  const unique = withoutRepeats(names);
  const index: SpeciesNames = { version: createHash("sha256").update(JSON.stringify(unique)).digest("hex").slice(0, 12), species: Object.fromEntries(table.nodes.map(({ id, name }) => [id, name])), names: unique };
  loaded = { ...index, search: createSpeciesSearch(index), misleading };
  return loaded;
}

/** "Umbalite (trade)" is the name Umbalite with a note. */
function nameAndNote(text: string): { name: string; note?: string } {
  const [, name = text, note] = /^(.*?) \((.*)\)$/.exec(text) ?? [];
  return note ? { name, note } : { name };
}

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** The same name of the same species is kept once, in the first kind that has it. */
function withoutRepeats(names: readonly SpeciesName[]): SpeciesName[] {
  const seen = new Set<string>();
  return names.filter(({ name, speciesId }) => {
    const key = `${speciesId} ${name.toLowerCase()}`;
    return seen.has(key) ? false : Boolean(seen.add(key));
  });
}
