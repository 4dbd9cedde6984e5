/** What makes a stone heavier or lighter than the usual make of its shape. */
export type WeightCorrection = keyof typeof weightCorrections;

/*
 * Factors, least and greatest, as published tables and common practice give them. A large culet adds as well, by an amount
 * that no source states: it is left to the note.
 */
export const weightCorrections = {
  girdleSlightlyThick: [1.02, 1.02],
  girdleThick: [1.02, 1.04],
  girdleVeryThick: [1.04, 1.09],
  pavilionBulge: [1.02, 1.06],
  deepNativeBulge: [1.06, 1.18],
  shallowOrWindowed: [0.95, 0.99],
} as const satisfies Readonly<Record<string, readonly [least: number, greatest: number]>>;

const girdles = ["girdleSlightlyThick", "girdleThick", "girdleVeryThick"] as const;
const bulges = ["pavilionBulge", "deepNativeBulge"] as const;

/** @returns words where two corrections exclude one another; null where they go together */
export function correctionConflict(corrections: readonly WeightCorrection[]): string | null {
  if (new Set(corrections).size < corrections.length) return "the same correction twice";
  for (const group of [girdles, bulges]) if (corrections.filter((each) => (group as readonly string[]).includes(each)).length > 1) return `${group.join(" and ")} exclude one another`;
  return null;
}
