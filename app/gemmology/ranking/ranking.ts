export type Verdict = "agrees" | "strained" | "contradicts";

/** One property of a candidate: what was seen, what the species shows, and how the two stand together. */
export type EvidenceLine = Readonly<{ property: string; observed: string; reference: string; logLikelihood: number; verdict: Verdict; because: string }>;
export type Candidate = Readonly<{ speciesId: string; name: string; probability: number; evidence: readonly EvidenceLine[] }>;

/** A ranking as product and interface give it out. Probabilities and `unlisted` sum to 1; never printed on a report. */
export type Ranking = Readonly<{
  id?: string;
  tableVersion: string;
  modelVersion: string;
  candidates: readonly Candidate[];
  unlisted: number;
  contradicted: ReadonlyArray<Readonly<{ speciesId: string; because: string }>>;
  inseparable: ReadonlyArray<Readonly<{ speciesIds: readonly string[]; settledBy: string }>>;
}>;
