/** Moves with every change of the model; kept beside each ranking. */
export const modelVersion = "2026.12-3";

/** Standard uncertainties of a trained operator with an instrument in check (default u summary of the instruments' notes; common practice). */
export const defaultU = { edge: 0.0015, spot: 0.008, interval: 0.003, criticalAngleDeg: 0.03, prismN: 0.0005, sg: 0.03, birefringence: 0.0012, liquidSg: 0.01, lineNm: 2, redLineNm: 3 } as const;
/** Soft edges of the table: rounding and locality. */
export const softness = { index: 0.0015, birefringence: 0.0008, sg: 0.02, betaShare: 0.05 } as const;
/** Spans over which a blunder is spread evenly. */
export const span = { index: 0.51, birefringence: 0.2, sg: 6 } as const;
/** Share of blunders among readings, by how well they could be taken. */
export const blunderShares = { good: 0.01, fair: 0.03, poor: 0.1 } as const;
/** Standard deviation of the error that all index readings of one stone share. */
export const sharedOffset = 0.0007;
export const priorFloor = 1e-4;
export const unlistedPrior = 0.03;
/** A good reading at least this far out contradicts; below `strained` it strains. Two-sided predictive probabilities. */
export const verdictAt = { contradicts: 0.001, strained: 0.05 } as const;
