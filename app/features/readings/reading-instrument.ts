import type { AppliedCorrection } from "#app/features/instruments/apply-correction.ts";

/** What a reading needs to know of the instrument that it was made on. */
export type ReadingInstrument = Readonly<{ resolution: number | null; standardUncertainty: number | null; upperLimit: number | null; prismIndex: number | null; /** In force; none where left out. */ correction?: AppliedCorrection | null }>;
