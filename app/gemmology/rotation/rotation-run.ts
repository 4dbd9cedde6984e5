/** One position: what was seen of the two edges. An edge that was not seen (hidden, or beyond the liquid) is null. */
export type RotationReading = Readonly<{
  angleDeg: number;
  upper: number | null;
  lower: number | null;
  /** Standard uncertainty of an edge. */
  u: number;
  /** Azimuth of the polariser from the facet's normal, in degrees, at which the upper edge is strongest. */
  polariserDeg: number | null;
}>;
export type RotationFacet = Readonly<{ label: string; readings: readonly RotationReading[] }>;
export type RotationRun = Readonly<{ facets: readonly RotationFacet[] }>;

/** Standard uncertainty of an edge in sodium light, where none is given (common practice). */
export const usualEdgeU = 0.0015;
/** Of a polariser's azimuth, widened for refraction into the prism (formulas.md §4.5 gives 6–8°). */
export const polariserUDeg = 7;
