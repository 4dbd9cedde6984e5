import type { Light, ReadingQuality } from "#app/domain/reading.ts";

type OfInstrument = Readonly<{ standardUncertainty: number | null; resolution: number | null }>;

/*
 * Standard uncertainties of one reading by a trained operator on an instrument in check, where the laboratory has no
 * study of its own: house values after common practice, to be overwritten on the instrument's card.
 */

export const usualUncertainty = {
  edge: 0.0015,
  /** Of an edge's: zero and prism cancel in the gap between two edges of one facet. */
  gapShare: 0.8,
  criticalAngleDeg: 0.03,
  prismIndex: 0.0005,
  /** Index by critical angle, in the middle of the scale. */
  criticalAngleIndex: 0.0007,
  waterTempC: 0.5,
  gaugeMm: 0.015,
} as const;

/** One edge on the index scale: 0.0015 in yellow light on a good facet, twice that in white light or on a fair one. */
export function edgeUncertainty({ instrument, light, quality }: { instrument: OfInstrument | null; light: Light; quality: ReadingQuality }): number {
  const own = instrument?.standardUncertainty ?? usualUncertainty.edge;
  if (quality === "poor") return Math.max(own, 0.005);
  return light === "white" || quality === "fair" ? Math.max(own, 0.003) : own;
}

/** The gap between two edges of one facet is known better than either edge. */
export function birefringenceUncertainty(edge: number): number {
  return usualUncertainty.gapShare * edge;
}

export function spotUncertainty({ quality }: { quality: ReadingQuality }): number {
  return quality === "good" ? 0.006 : quality === "fair" ? 0.01 : 0.02;
}

export function angleUncertaintyDeg(instrument: OfInstrument | null): number {
  return instrument?.standardUncertainty ?? usualUncertainty.criticalAngleDeg;
}

/** A weighing in air, carats: by the balance's step where it has no study. */
export function weighingUncertaintyCt(instrument: OfInstrument | null): number {
  if (instrument?.standardUncertainty) return instrument.standardUncertainty;
  return (instrument?.resolution ?? 0.001) >= 0.01 ? 0.006 : 0.0015;
}

/** A weighing in water, carats: the wire's surface tension and bubbles add to that in air. */
export function waterWeighingUncertaintyCt(instrument: OfInstrument | null): number {
  return Math.hypot(weighingUncertaintyCt(instrument), (instrument?.resolution ?? 0.001) >= 0.01 ? 0.0104 : 0.0037);
}

export function gaugeUncertaintyMm(instrument: OfInstrument | null): number {
  return instrument?.standardUncertainty ?? usualUncertainty.gaugeMm;
}
