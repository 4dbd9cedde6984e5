/**
 * Liquids for an immersion cell, with their index at 589.3 nm near 20 °C, to about 0.005: how a facet's edges stand out
 * tells whether the stone's index is higher or lower.
 *
 * Source: International Tables for Crystallography C, table 3.3.2.1 (water, glycerol, diiodomethane); the others from public
 * reference pages. Porous, organic, glued, filled and foiled stones do not go into any of them.
 */
export const immersionLiquids = [
  { name: "water", n: 1.333, caution: null },
  { name: "ethanol", n: 1.361, caution: "flammable" },
  { name: "glycerol", n: 1.473, caution: null },
  { name: "benzyl benzoate", n: 1.57, caution: "irritant: gloves, ventilation" },
  { name: "1-bromonaphthalene", n: 1.66, caution: "harmful: gloves, ventilation" },
  { name: "diiodomethane", n: 1.74, caution: "toxic and irritant, darkens in light: gloves, extraction" },
] as const;
