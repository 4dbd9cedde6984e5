import type { SpeciesRow } from "./species-row.ts";

export const harmfulTests = ["contactLiquid", "immersion", "water", "heavyLiquid", "ultraviolet", "thermalProbe", "hotLamp", "ultrasonic", "solvent", "acid", "hardness"] as const;
export type HarmfulTest = (typeof harmfulTests)[number];
/** 0 none, 0.1 can be undone, 1 damage is possible, 10 ruin. */
export type Harm = 0 | 0.1 | 1 | 10;

const ruinous = [10, 10, 1, 10, 0, 0.1, 1, 10, 10, 10, 10] as const;
/**
 * What tests can do to kinds of material, in the order of `harmfulTests`; the worst of a range. House values, common
 * practice, gathered from care guides. Null: the kind says nothing about the test.
 */
const harms = {
  hard: [0, 0, 0, 0, 0, 0, 0.1, 0.1, 0, 0.1, 10],
  diamond: [0, 0, 0, 0, 0, 0, 0.1, 0.1, 0, 0, 10],
  cleavable: [0, 0, 0, 0, 0.1, 0.1, 1, 10, 0, 10, 10],
  lightSensitive: [0, 0, 0, 0, 1, 0, 1, 1, 0, 0.1, 10],
  heatSensitive: [null, null, null, null, 0, 0.1, 10, 10, null, null, 10],
  opal: [1, 1, 0.1, 1, 0, 0.1, 10, 10, 1, 1, 10],
  porous: ruinous,
  organic: [10, 10, 1, 10, 0.1, 1, 10, 10, 10, 10, 10],
  resin: [10, 10, 0, 10, 0.1, 1, 10, 10, 10, 1, 10],
  oiled: [0.1, 1, 0, 1, 0, 0, 1, 10, 10, 1, 10],
  glassFilled: [0.1, 1, 0, 1, 0, 0.1, 10, 10, 1, 10, 10],
  impregnated: [0.1, 1, 0, 1, 0, 0.1, 1, 1, 10, 1, 10],
  coated: [1, 1, 0.1, 1, 0, 0.1, 1, 10, 10, 10, 10],
  assembled: [0.1, 10, 10, 10, 0, 0.1, 10, 10, 10, 10, 10],
  softOrSoluble: [1, 0.1, 10, 1, 0, 1, 1, 10, 1, 10, 10],
} as const satisfies Record<string, ReadonlyArray<Harm | null>>;
export type HarmClass = keyof typeof harms;

/** What tests can do to a form in the worst case of all kinds it falls under. */
export function testHarm(row: SpeciesRow): Readonly<Record<HarmfulTest, Harm>> {
  const kinds = harmClassesOf(row);
  return Object.fromEntries(harmfulTests.map((test, at) => [test, Math.max(...kinds.map((kind) => harms[kind][at] ?? 0))])) as Record<HarmfulTest, Harm>;
}

/** Kinds of material a form falls under, from what its row says of it; never empty. */
export function harmClassesOf(row: SpeciesRow): HarmClass[] {
  const cautions = row.cautions.join("; ");
  const treatments = row.treatments_common.filter((treatment) => !/\brare\b/.test(treatment)).join("; ");
  const is = (pattern: RegExp, text: string | null = cautions) => text !== null && pattern.test(text);
  const isResin = row.group === "plastic" || is(/^(amber|copal|jet|vulcanite)/, row.id);
  const kinds: Record<HarmClass, boolean> = {
    hard: true,
    diamond: row.group === "diamond",
    cleavable: is(/\bperfect\b/, row.cleavage) || is(/cleav/),
    lightSensitive: is(/\bfades?\b|revert in ultraviolet/),
    heatSensitive: is(/\bheat\b|thermal shock/) || row.group === "opal" || row.group === "zircon" || is(/^(quartz-amethyst|zoisite-tanzanite|apatite)$/, row.id),
    opal: row.group === "opal",
    porous: is(/\bporous\b|absorbs/),
    organic: row.kind === "organic" && !isResin,
    resin: isResin,
    oiled: is(/\b(oil|oiling|resin)\b/, treatments) || is(/\boil or resin\b/),
    glassFilled: is(/glass-filled|fracture-filled/, row.id),
    impregnated: is(/impregnat|polymer|wax/, treatments),
    coated: is(/coated|diffusi|diffused|overgrowth/, row.id),
    assembled: row.kind === "composite" && !is(/glass-filled/, row.id),
    softOrSoluble: (row.hardness !== null && row.hardness.max < 3) || is(/soluble|attacked by water|swells in water/),
  };
  return (Object.keys(kinds) as HarmClass[]).filter((kind) => kinds[kind]);
}
