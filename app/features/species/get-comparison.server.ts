import { compareSpecies, type ComparedRow } from "./compare-species.ts";
import { linker, type FormLink } from "./get-species.server.ts";
import { loadSpeciesNames } from "./load-species-names.server.ts";
import { loadSpeciesTable } from "./load-species-table.server.ts";
import { alikeGroupsOf } from "./look-alikes.ts";
import { formatSpeciesRef, mostCompared, type SpeciesRef } from "./species-ref.ts";

export type ComparedColumn = Readonly<{ ref: string; speciesId: string; formId: string | null; name: string; /** The species where the column is one form of it. */ speciesName: string | null }>;
/** One sentence of the table on how one of the columns is told from another. */
export type ComparedSeparation = Readonly<{ from: FormLink; other: FormLink; by: string }>;
export type Comparison = Readonly<{
  columns: readonly ComparedColumn[];
  rows: readonly ComparedRow[];
  separations: readonly ComparedSeparation[];
  /** Constants that do not separate some of the columns, and what does. */
  alike: ReadonlyArray<Readonly<{ shared: string; bench: readonly string[]; laboratory: readonly string[] }>>;
  namesVersion: string;
}>;

/** Up to four species or forms side by side; what the table does not know is left out. */
export function getComparison(refs: readonly SpeciesRef[]): Comparison {
  const { table, rows, lookalikes } = loadSpeciesTable();
  const rowById = new Map(rows.map((row) => [row.id, row]));
  const chosen = refs.flatMap((ref) => {
    const node = table.nodes.find(({ id }) => id === ref.speciesId);
    const forms = node?.forms.filter(({ id }) => ref.formId === null || id === ref.formId) ?? [];
    if (!node || forms.length === 0) return [];
    const isOneForm = ref.formId !== null && node.forms.length > 1;
    const column: ComparedColumn = { ref: formatSpeciesRef(isOneForm ? ref : { speciesId: node.id, formId: null }), speciesId: node.id, formId: isOneForm ? ref.formId : null, name: isOneForm ? forms[0]!.name : node.name, speciesName: isOneForm ? node.name : null };
    return [{ column, forms, rows: forms.map(({ id }) => rowById.get(id)!) }];
  });
  const columns = chosen.filter(({ column }, at) => chosen.findIndex((one) => one.column.ref === column.ref) === at).slice(0, mostCompared);
  const link = linker();
  const pairs = columns.flatMap((one) => columns.filter((other) => other !== one).map((other) => [one, other] as const));
  const separations = pairs.flatMap(([one, other]) => {
    const others = new Set(other.rows.map(({ id }) => id));
    return one.rows.flatMap((row) => row.separated_from.filter(({ id }) => others.has(id)).map(({ id, by }) => ({ from: link(row.id), other: link(id), by })));
  });
  const alike = new Map(
    pairs.flatMap(([one, other]) => one.rows.flatMap((row) => other.rows.flatMap((against) => (row.id === against.id ? [] : alikeGroupsOf([row.id, against.id], lookalikes)))).map(({ shared, bench, laboratory }) => [shared, { shared, bench, laboratory }] as const)),
  );
  return { columns: columns.map(({ column }) => column), rows: columns.length === 0 ? [] : compareSpecies(columns), separations, alike: [...alike.values()], namesVersion: loadSpeciesNames().version };
}

/** The species or form that a person's words fit best; undefined where they fit none. */
export function findSpeciesRef(words: string): SpeciesRef | undefined {
  const [found] = loadSpeciesNames().search(words, 1);
  return found && { speciesId: found.speciesId, formId: found.by.kind === "species" || found.by.kind === "family" ? null : found.by.formId };
}
