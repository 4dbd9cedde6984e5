import type { SpeciesTable } from "#app/gemmology/species/species-table.ts";

export type PublishedStone = {
  id: string;
  truth: { species: string; variety: string | null; kind: string };
  readings: {
    ri_low: number | null; ri_high: number | null; ri_spot: number | null; ri_over_limit: boolean; birefringence: number | null; optic_character: string | null; optic_sign: "+" | "-" | null; sg: number | null;
    colour: string | null; transparency: string | null; pleochroism: string[] | null; fluorescence_lw: string | null; fluorescence_sw: string | null; absorption_nm: number[] | null; colour_filter: string | null; phenomenon: string | null;
  };
  tier: string;
  score_as: "rank" | "not_excluded" | "not_excluded_or_abstain";
  ri_pair?: "two indices" | "variation across stones";
  also_reported?: { sg_range?: [number, number] };
  source: string;
};

const characters: Record<string, string> = { SR: "isotropic", ADR: "anomalous", DR: "anisotropic", uniaxial: "uniaxial", biaxial: "biaxial", aggregate: "aggregate" };
const strengths: ReadonlyArray<[RegExp, string]> = [[/inert|none/, "inert"], [/strong/, "strong"], [/medium|moderate/, "moderate"], [/weak|faint/, "weak"]];
/** Exact indices of an optical bench; otherwise what a trained operator reads (instruments.md, default uncertainties). */
const exactU = 0.0005;

/** A published stone as evidence. What a report gives for a set of stones is told with the spread of the set. */
export function evidenceOf({ id, readings: r, tier, ri_pair: pair, also_reported: also }: PublishedStone): unknown {
  const u = tier === "optical-bench" ? { u: exactU } : {};
  const ri: object[] = [];
  if (r.ri_low !== null && r.ri_high !== null && r.ri_high > r.ri_low) {
    if (pair === "variation across stones") ri.push({ kind: "single", n: (r.ri_low + r.ri_high) / 2, u: Math.hypot((r.ri_high - r.ri_low) / Math.sqrt(12), 0.0015) });
    else ri.push({ kind: "edges", low: r.ri_low, high: r.ri_high, rotated: true, ...u });
  } else if ((r.ri_low ?? r.ri_high) !== null) ri.push({ kind: "single", n: (r.ri_low ?? r.ri_high)!, ...u });
  // Two decimals are a spot; three in the column of a dome's reading were read from an edge.
  if (r.ri_spot !== null) ri.push(Math.abs(r.ri_spot * 100 - Math.round(r.ri_spot * 100)) < 1e-6 ? { kind: "spot", n: r.ri_spot } : { kind: "single", n: r.ri_spot, ...u });
  if (r.ri_over_limit) ri.push({ kind: "overLimit", limit: 1.79 });
  const range = also?.sg_range;
  const fluorescence = (text: string | null) => {
    const found = text && strengths.find(([pattern]) => pattern.test(text));
    return found ? { strength: found[1] } : undefined;
  };
  const [longWave, shortWave] = [fluorescence(r.fluorescence_lw), fluorescence(r.fluorescence_sw)];
  return {
    id,
    ...(ri.length > 0 && { ri }),
    ...(r.birefringence !== null && { birefringence: { value: r.birefringence } }),
    ...(r.optic_character && { opticCharacter: characters[r.optic_character] }),
    ...(r.optic_sign && { opticSign: r.optic_sign }),
    ...(r.sg !== null && { sg: { value: r.sg, ...(range && range[1] > range[0] && { u: Math.hypot((range[1] - range[0]) / Math.sqrt(12), 0.02) }) } }),
    ...(r.colour && { colour: [r.colour] }),
    ...(r.transparency && /^(transparent|translucent|opaque)$/.test(r.transparency) && { transparency: r.transparency }),
    ...((longWave || shortWave) && { fluorescence: { ...(longWave && { longWave }), ...(shortWave && { shortWave }) } }),
    ...(r.absorption_nm && r.absorption_nm.length > 0 && { absorption: r.absorption_nm.map((nm) => ({ nm, kind: "line" })) }),
    ...(r.phenomenon && { phenomena: [r.phenomenon.replace(/ \(.*/, "")] }),
  };
}

/** Names of publications that are not those of the table. */
const otherNames: Readonly<Record<string, readonly string[]>> = {
  "garnet: grossular": ["garnet-grossular"],
  "garnet: pyrope": ["garnet-pyrope"],
  "garnet: andradite": ["garnet-andradite"],
  "garnet: pyrope-almandine": ["garnet-pyrope-almandine"],
  "garnet: pyrope-spessartine": ["garnet-pyrope-spessartine"],
  "yag (yttrium aluminium garnet)": ["yag"],
  "plastic (opal imitation)": ["plastic"],
  "plastic (acrylic)": ["plastic"],
};

/** The nodes that count as the truth; none where the table has no such species. */
export function trueSpeciesIds({ truth }: PublishedStone, { nodes }: SpeciesTable): string[] {
  const name = truth.species.toLowerCase();
  if (otherNames[name]) return nodes.filter(({ id }) => otherNames[name]!.includes(id)).map(({ id }) => id);
  const matching = nodes.filter((node) => node.id === name || node.name.toLowerCase() === name || node.forms.some((form) => form.id === name || form.name.toLowerCase() === name));
  if (matching.length > 0) return matching.map(({ id }) => id);
  return nodes.filter((node) => node.name.toLowerCase().split(/[ ,(]/)[0] === name.split(/[ ,(]/)[0] || node.id.split("-")[0] === name).map(({ id }) => id);
}
