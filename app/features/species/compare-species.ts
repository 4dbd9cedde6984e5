import { formatInterval } from "#app/domain/format-interval.ts";
import type { SpeciesRow } from "#app/gemmology/species/species-row.ts";
import { speciesSpan } from "#app/gemmology/species/species-span.ts";
import type { Interval, SpeciesForm } from "#app/gemmology/species/species-table.ts";
import { opticWords } from "./optic-words.ts";
import * as words from "./property-words.ts";

/** A species, or one form of it, that stands in a column. */
export type ComparedSpecies = Readonly<{ forms: readonly SpeciesForm[]; rows: readonly SpeciesRow[] }>;
/**
 * How the columns of one property stand to each other: "apart" no value can belong to two of them, "someApart" to some
 * two of them, "overlapping" the ranges differ and share values, "differs" the words differ, "alike", "open" where a
 * column has no value.
 */
export type Likeness = "apart" | "someApart" | "overlapping" | "differs" | "alike" | "open";
export type ComparedCell = Readonly<{ text: string; interval: Interval | null }>;
export type ComparedRow = Readonly<{ property: string; label: string; likeness: Likeness; cells: readonly ComparedCell[]; /** Spans all columns, where they are ranges. */ axis: Interval | null }>;

/** Every property that two or more species can be told apart by, a row each. */
export function compareSpecies(columns: readonly ComparedSpecies[]): ComparedRow[] {
  const ranges = (property: string, label: string, decimals: number, read: (column: ComparedSpecies) => Interval | null, none = "no value") =>
    rangeRow({ property, label }, columns.map((column) => ({ interval: read(column), none })), decimals);
  const phrases = (property: string, label: string, read: words.PropertyWords) => wordRow({ property, label }, columns.map(({ rows }) => read(rows)));
  return [
    ranges("lowIndex", "Low index", 3, ({ forms }) => around(forms.flatMap(({ lowIndex, spotIndex }) => lowIndex ?? spotIndex ?? []))),
    ranges("highIndex", "High index", 3, ({ forms }) => around(forms.flatMap(({ highIndex, spotIndex }) => highIndex ?? spotIndex ?? []))),
    ranges("birefringence", "Birefringence", 3, ({ forms }) => speciesSpan(forms).birefringence),
    wordRow({ property: "optics", label: "Character and sign" }, columns.map(({ forms }) => [opticWords(forms)])),
    ranges("sg", "Density", 2, ({ forms }) => speciesSpan(forms).sg),
    // One conventional value a form, not a range: it differs, and proves nothing.
    phrases("dispersion", "Dispersion, B–G", (rows) => [...new Set(rows.flatMap(({ dispersion_BG: dispersion }) => (dispersion === null ? [] : dispersion.toFixed(3))))]),
    ranges("hardness", "Hardness, Mohs (never tested)", 1, ({ rows }) => around(rows.flatMap(({ hardness }) => (hardness ? [hardness.min, hardness.max] : [])))),
    phrases("colours", "Colours", words.colourWords),
    phrases("transparency", "Transparency", words.transparencyWords),
    phrases("lustre", "Lustre", words.lustreWords),
    phrases("pleochroism", "Pleochroism", words.pleochroismWords),
    phrases("absorption", "Spectrum, clear and strong", words.absorptionWords),
    phrases("longWave", "Long-wave ultraviolet", words.longWaveWords),
    phrases("shortWave", "Short-wave ultraviolet", words.shortWaveWords),
    phrases("filter", "Colour filter", words.filterWords),
    phrases("thermal", "Thermal probe", words.thermalWords),
    phrases("phenomena", "Phenomena", words.phenomenonWords),
    phrases("cleavage", "Cleavage", words.cleavageWords),
    phrases("inclusions", "Under magnification", words.inclusionWords),
    phrases("treatments", "Treatments", words.treatmentWords),
  ].filter(({ cells }) => cells.some(({ text }) => text !== noValue));
}

const noValue = "no value";
type Named = { property: string; label: string };

function rangeRow(named: Named, columns: ReadonlyArray<{ interval: Interval | null; none: string }>, decimals: number): ComparedRow {
  const known = columns.flatMap(({ interval }) => (interval ? [interval] : []));
  const cells = columns.map(({ interval, none }) => ({ text: interval ? (interval[1] === 0 ? "none" : formatInterval(interval, decimals)) : none, interval }));
  const pairs = known.flatMap((one, at) => known.slice(at + 1).map((other) => one[1] < other[0] || other[1] < one[0]));
  const isAlike = new Set(cells.map(({ text }) => text)).size === 1;
  const isOpen = known.length < columns.length;
  const likeness = pairs.includes(true) ? (isOpen || pairs.includes(false) ? "someApart" : "apart") : isOpen ? "open" : isAlike ? "alike" : "overlapping";
  return { ...named, cells, likeness, axis: around(known.flat()) };
}

function wordRow(named: Named, columns: ReadonlyArray<readonly string[]>): ComparedRow {
  const cells = columns.map((items) => ({ text: items.length > 0 ? items.join("; ") : noValue, interval: null }));
  const said = new Set(columns.map((items) => items.toSorted().join("\n")));
  return { ...named, cells, likeness: said.size === 1 ? "alike" : columns.some((items) => items.length === 0) ? "open" : "differs", axis: null };
}

function around(values: readonly number[]): Interval | null {
  return values.length === 0 ? null : [Math.min(...values), Math.max(...values)];
}
