type Dated = Readonly<{ sequence: number; recordedAt: Date; strike: Readonly<{ struckAt: Date }> | null }>;
export type RankingView = Readonly<{ /** Number of the last reading counted; null: all. */ atSequence: number | null; areStruckCounted: boolean }>;

/**
 * The readings that a ranking is looked at with: as they stood right after one of them was made, when later ones were not
 * there and later strikes had not been made, and, if wished, with those that are struck.
 */
export function readingsAsOf<Reading extends Dated>(readings: readonly Reading[], { atSequence, areStruckCounted }: RankingView): Reading[] {
  const moment = atSequence === null ? null : readings.find(({ sequence }) => sequence === atSequence)?.recordedAt;
  const present = moment ? readings.filter(({ sequence }) => sequence <= atSequence!) : [...readings];
  const standing = (strike: Reading["strike"]) => areStruckCounted || (moment && strike && strike.struckAt > moment);
  return present.map((reading) => (standing(reading.strike) ? { ...reading, strike: null } : reading));
}
