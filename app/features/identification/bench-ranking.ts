export type Measured = Readonly<{ value: number; u: number }>;

/** How one property of one species stands to what was observed, for a lane of the bench. */
export type Lane = Readonly<{
  property: string;
  label: string;
  verdict: "agrees" | "strained" | "contradicts";
  because: string;
  /** Natural logarithm of how likely the species would show what was observed. */
  logLikelihood: number;
  /** In words: "1.757–1.779". */
  reference: string;
  observed: string;
  /** Null where the property is no number. */
  scale: Readonly<{ axisMin: number; axisMax: number; referenceLow: number; referenceHigh: number; observedLow: number; observedHigh: number; u: number }> | null;
}>;

export type BenchCandidate = Readonly<{ speciesId: string; name: string; probability: number; lanes: readonly Lane[] }>;
export type RuledOut = Readonly<{
  speciesId: string;
  name: string;
  because: string;
  /** Readings that contradict it by themselves; without a number the one that is being typed; none where only all of them together do. */
  readings: ReadonlyArray<Readonly<{ sequence: number | null; because: string }>>;
}>;

/** What the bench shows of a ranking: from saved readings on the server, with the one being typed in the browser. */
export type BenchRanking = Readonly<{
  tableVersion: string;
  modelVersion: string;
  speciesCount: number;
  hasEvidence: boolean;
  candidates: readonly BenchCandidate[];
  /** Candidates beyond those shown. */
  otherCount: number;
  /** The likeliest ones by name, to choose two of; and the two that were chosen. */
  comparable: ReadonlyArray<Readonly<{ speciesId: string; name: string }>>;
  compared: readonly BenchCandidate[];
  unlisted: number;
  /** The likeliest of them first; on the server not all. */
  ruledOut: readonly RuledOut[];
  ruledOutCount: number;
  inseparable: ReadonlyArray<Readonly<{ names: readonly string[]; settledBy: string }>>;
  /** Where the readings stand on the map of index and density. */
  index: Measured | null;
  density: Measured | null;
}>;
