import { betaShareOf } from "./beta-share.ts";
import { colourMask } from "./colour-mask.ts";
import { testHarm } from "./test-harm.ts";
import type { Absorption, Fluorescence, LookalikeRow, NodeRow, Range, SpeciesRow, TabulatedCharacter } from "./species-row.ts";
import type { Glow, Interval, Lookalike, SpeciesForm, SpeciesNode, SpeciesTable, VarietySpectrum } from "./species-table.ts";

/** Prior weight of a form by its prevalence 1 (collector's rarity) to 5 (everyday); a house rule, common practice. A species weighs what its forms weigh together. */
const weightOfPrevalence: readonly number[] = [0, 0.015, 0.05, 0.15, 0.4, 1];
/** Assembled pieces are recognised by their seam before they are measured, so few of them reach the readings; house value. */
const compositeFactor = 0.25;

/**
 * Gathers the rows of the species file under their species.
 * @param version names the content; it goes into every ranking
 * @throws RangeError when a node names a row that is not there, or a row belongs to no node or to two
 */
export function buildSpeciesTable({ version, rows, nodes, lookalikes }: { version: string; rows: readonly SpeciesRow[]; nodes: readonly NodeRow[]; lookalikes: readonly LookalikeRow[] }): SpeciesTable {
  const rowById = new Map(rows.map((row) => [row.id, row]));
  const nodeOfRow = new Map<string, string>();
  for (const node of nodes) {
    for (const rowId of node.rows) {
      if (!rowById.has(rowId)) throw new RangeError(`node ${node.id} names a row that is not there: ${rowId}`);
      if (nodeOfRow.has(rowId)) throw new RangeError(`row ${rowId} belongs to ${nodeOfRow.get(rowId)} and to ${node.id}`);
      nodeOfRow.set(rowId, node.id);
    }
  }
  const homeless = rows.find(({ id }) => !nodeOfRow.has(id));
  if (homeless) throw new RangeError(`row ${homeless.id} belongs to no node`);
  return { version, nodes: nodes.map((node) => nodeOf(node, node.rows.map((id) => rowById.get(id)!))), lookalikes: lookalikes.flatMap((group) => lookalikeOf(group, nodeOfRow)) };
}

function nodeOf(node: NodeRow, rows: readonly SpeciesRow[]): SpeciesNode {
  const weights = rows.map(({ prevalence, kind }) => (weightOfPrevalence[prevalence] ?? 0.015) * (kind === "composite" ? compositeFactor : 1));
  const sum = weights.reduce((total, weight) => total + weight, 0);
  return { id: node.id, name: node.name, weight: sum, forms: rows.map((row, index) => formOf(row, weights[index]! / sum)) };
}

/** Of the tests that can do harm, those that a bench offers at all. */
const benchTests = ["contactLiquid", "immersion", "water", "heavyLiquid", "ultraviolet", "thermalProbe"] as const;

/**
 * Mixed crystals of a light and a heavy end member, and what varies like them: beryl by its alkalis, zircon by its damage
 * (Deer, Howie and Zussman, An Introduction to the Rock-Forming Minerals; Holland and Gottfried, Acta Cryst. 8 (1955) 291).
 */
const seriesGroups = new Set(["garnet", "tourmaline", "olivine", "pyroxene", "scapolite", "epidote"]);
const seriesRows = new Set(["emerald", "aquamarine", "morganite", "beryl-yellow-green", "goshenite", "beryl-maxixe", "zircon-low", "zircon-intermediate", "spinel-gahnospinel", "spinel-black", "spinel-blue", "feldspar-albite", "feldspar-oligoclase-sunstone", "feldspar-andesine", "feldspar-labradorite", "feldspar-bytownite"]);

const interval = (range: Range | null | undefined): Interval | null => (range ? [range.min, range.max] : null);

function formOf(row: SpeciesRow, share: number): SpeciesForm {
  const { ri } = row;
  const single = ri?.n;
  const [low, high] = ri?.alpha && ri.gamma ? ([ri.alpha, ri.gamma] as const) : ri?.omega && ri.epsilon ? byIndex(ri.omega, ri.epsilon) : ([single, single] as const);
  const harm = testHarm(row);
  const strengths = { none: 0, weak: 1, distinct: 2, strong: 3 } as const;
  return {
    id: row.id,
    name: row.name,
    kind: row.kind,
    share,
    character: (typeof row.optic_character === "string" ? [row.optic_character] : row.optic_character) as TabulatedCharacter[],
    sign: row.optic_sign,
    lowIndex: interval(low),
    highIndex: interval(high),
    spotIndex: interval(ri?.spot),
    birefringence: interval(row.birefringence),
    betaShare: betaShareOf(row),
    sg: interval(row.sg),
    usual: {
      ...(low && { lowIndex: low.typ }),
      ...(high && { highIndex: high.typ }),
      ...(ri?.spot && { spotIndex: ri.spot.typ }),
      ...(row.birefringence && { birefringence: row.birefringence.typ }),
      ...(row.sg && { sg: row.sg.typ }),
    },
    colours: row.colours.map((colour) => colour.toLowerCase()),
    transparency: row.transparency,
    lustre: row.lustre,
    pleochroism: Math.max(0, ...(row.pleochroism ?? []).map(({ strength }) => strengths[strength])),
    absorption: spectraOf(row.absorption),
    longWave: row.fluorescence.lw.map(glowOf),
    shortWave: row.fluorescence.sw.map(glowOf),
    filterRed: row.colour_filter ? Object.values(row.colour_filter).some((look) => /red|pink/.test(look) && !/no red|not red/.test(look)) : null,
    thermal: row.thermal,
    isMagnetic: /Fe|Mn/.test(row.formula ?? "") && row.formula !== "FeS2",
    phenomena: row.phenomena.map((phenomenon) => phenomenon.toLowerCase()),
    harmedBy: benchTests.filter((test) => harm[test] >= 1),
    isSeries: row.kind === "natural" && (seriesGroups.has(row.group) || seriesRows.has(row.id)),
  };
}

/** Spectra by colour variety; what every stone shows stands in each. */
function spectraOf(absorption: readonly Absorption[]): VarietySpectrum[] {
  const isCommon = ({ colour_variety: variety }: Absorption) => !variety || variety === "all";
  const line = ({ nm, kind, width_nm: width, strength }: Absorption) => [nm, kind === "line" ? (width ?? 2) / 2 : (width ?? 40) / 2, strength] as const;
  const varieties = [...new Set(absorption.filter((each) => !isCommon(each)).map(({ colour_variety: variety }) => variety!))];
  if (varieties.length === 0) return absorption.length === 0 ? [] : [{ colours: 0, lines: absorption.map(line) }];
  return varieties.map((variety) => ({ colours: colourMask(variety), lines: absorption.filter((each) => isCommon(each) || each.colour_variety === variety).map(line) }));
}

function glowOf({ strength, strength_min: least, colour }: Fluorescence): Glow {
  return [least ?? strength, strength, colourMask(colour)];
}

/** ω and ε in order of size; a species whose sign changes keeps the wider sense of both. */
function byIndex(omega: Range, epsilon: Range): readonly [Range, Range] {
  return omega.typ <= epsilon.typ ? [omega, epsilon] : [epsilon, omega];
}

function lookalikeOf({ members, bench, laboratory }: LookalikeRow, nodeOfRow: ReadonlyMap<string, string>): Lookalike[] {
  const speciesIds = [...new Set(members.flatMap((member) => nodeOfRow.get(member) ?? []))].sort();
  if (speciesIds.length < 2) return [];
  const settledBy = [bench.length > 0 ? `At the bench: ${bench.join("; ")}` : "", laboratory.length > 0 ? `In a laboratory: ${laboratory.join("; ")}` : ""].filter(Boolean).join(". ");
  return [{ speciesIds, settledBy }];
}
