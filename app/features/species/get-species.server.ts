import { AppError } from "#app/domain/app-error.ts";
import type { Absorption, SpeciesKind, SpeciesRow } from "#app/gemmology/species/species-row.ts";
import { speciesSpan, type SpeciesSpan } from "#app/gemmology/species/species-span.ts";
import { testHarm, type Harm, type HarmfulTest } from "#app/gemmology/species/test-harm.ts";
import { lightInside, type LightLine } from "./light-inside.ts";
import { loadSpeciesNames } from "./load-species-names.server.ts";
import { loadSpeciesTable } from "./load-species-table.server.ts";
import { alikeGroupsOf, separationsOf } from "./look-alikes.ts";
import { opticWords } from "./optic-words.ts";
import * as words from "./property-words.ts";
import { speciesConstants, type SpeciesConstants } from "./species-constants.ts";

/** A form as a link needs it. */
export type FormLink = Readonly<{ speciesId: string; formId: string; name: string }>;

export type SpeciesSheet = Readonly<{
  id: string;
  name: string;
  tableVersion: string;
  forms: ReadonlyArray<Readonly<{ id: string; name: string; kind: SpeciesKind; optics: string; span: SpeciesSpan }>>;
  form: Readonly<{
    id: string;
    name: string;
    kind: SpeciesKind;
    formula: string | null;
    system: string | null;
    family: string;
    tradeNames: readonly string[];
    constants: SpeciesConstants;
    light: readonly LightLine[];
    seen: ReadonlyArray<Readonly<{ label: string; items: readonly string[] }>>;
    absorption: readonly Absorption[];
    glow: Readonly<{ longWave: readonly string[]; shortWave: readonly string[]; note: string | null }>;
    inclusions: readonly string[];
    treatments: readonly string[];
    hasSynthetic: boolean;
    harm: Readonly<Record<HarmfulTest, Harm>>;
    cautions: readonly string[];
  }>;
  /** What others that are taken for it show, and what it shows against still others. */
  theyShow: ReadonlyArray<FormLink & Readonly<{ by: string }>>;
  itShows: ReadonlyArray<FormLink & Readonly<{ by: string }>>;
  alike: ReadonlyArray<Readonly<{ shared: string; others: readonly FormLink[]; bench: readonly string[]; laboratory: readonly string[] }>>;
  /** Names that are used for this form and mislead. */
  avoid: ReadonlyArray<Readonly<{ name: string; note: string | null }>>;
  /** Names that claim this form and mean something else. */
  notThis: ReadonlyArray<Readonly<{ name: string; note: string | null; means: readonly FormLink[] }>>;
}>;

/** One species with one of its forms in full; the most common one where none is asked for. @throws AppError not_found */
export function getSpecies({ speciesId, formId }: { speciesId: string; formId: string | null }): SpeciesSheet {
  const { table, rows, lookalikes } = loadSpeciesTable();
  const node = table.nodes.find(({ id }) => id === speciesId);
  if (!node) throw new AppError("not_found", "There is no such species in the table. Look for it by another name.");
  const shown = node.forms.find(({ id }) => id === formId) ?? node.forms.reduce((one, other) => (other.share > one.share ? other : one));
  const row = rows.find(({ id }) => id === shown.id)!;
  const link = linker();
  const { misleading } = loadSpeciesNames();
  const separations = separationsOf(row, rows);
  return {
    id: node.id,
    name: node.name,
    tableVersion: table.version,
    forms: node.forms.map((form) => ({ id: form.id, name: form.name, kind: form.kind, optics: opticWords([form]), span: speciesSpan([form]) })),
    form: formSheet(row),
    theyShow: separations.theyShow.map(({ formId: other, by }) => ({ ...link(other), by })),
    itShows: separations.itShows.map(({ formId: other, by }) => ({ ...link(other), by })),
    alike: alikeGroupsOf([row.id], lookalikes).map(({ formIds, ...group }) => ({ ...group, others: formIds.filter((id) => id !== row.id).map(link) })),
    avoid: misleading.filter(({ means }) => means.includes(row.id)).map(({ name, note, claims }) => ({ name, note: claims.length > 0 ? null : note })),
    notThis: misleading.filter(({ claims, means }) => claims.includes(row.id) && !means.includes(row.id)).map(({ name, note, means }) => ({ name, note, means: means.map(link) })),
  };
}

/** Where a form stands and what it is called. */
export function linker(): (formId: string) => FormLink {
  const links = new Map(loadSpeciesTable().table.nodes.flatMap(({ id, forms }) => forms.map((form) => [form.id, { speciesId: id, formId: form.id, name: form.name }] as const)));
  return (formId) => links.get(formId)!;
}

function formSheet(row: SpeciesRow): SpeciesSheet["form"] {
  const one = [row];
  return {
    id: row.id,
    name: row.name,
    kind: row.kind,
    formula: row.formula,
    system: row.crystal_system,
    family: row.group.replaceAll("-", " "),
    tradeNames: row.trade_names,
    constants: speciesConstants(row),
    light: lightInside(row),
    seen: [
      { label: "Colours", items: words.colourWords(one) },
      { label: "Transparency", items: words.transparencyWords(one) },
      { label: "Lustre", items: words.lustreWords(one) },
      { label: "Phenomena", items: words.phenomenonWords(one) },
      { label: "Pleochroism", items: words.pleochroismWords(one) },
      { label: "Colour filter", items: words.filterWords(one) },
      { label: "Thermal probe", items: words.thermalWords(one) },
      { label: "Cleavage", items: words.cleavageWords(one) },
      { label: "Fracture", items: words.fractureWords(one) },
    ].filter(({ items }) => items.length > 0),
    absorption: row.absorption.toSorted((a, b) => b.nm - a.nm),
    glow: { longWave: words.longWaveWords(one), shortWave: words.shortWaveWords(one), note: row.fluorescence.note ?? null },
    inclusions: row.inclusions_diagnostic,
    treatments: row.treatments_common,
    hasSynthetic: row.synthetics_known,
    harm: testHarm(row),
    cautions: row.cautions,
  };
}
