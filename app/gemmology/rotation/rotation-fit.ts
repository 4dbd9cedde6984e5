export type SolutionCharacter = "isotropic" | "uniaxial" | "biaxial" | "undetermined";
type Indices = Readonly<{ n: number } | { omega: number; epsilon: number } | { alpha: number; beta: number; gamma: number } | { alpha: number } | { gamma: number }>;

/** Where an axis of the crystal stands to a facet, without arrow. */
export type AxisOnFacet = Readonly<{ axis: "c" | "X" | "Y" | "Z"; fromNormalDeg: number; /** Rotation at which it points along the prism. */ azimuthDeg: number }>;

export type RotationSolution = Readonly<{
  character: SolutionCharacter;
  sign: "+" | "-" | null;
  indices: Indices;
  /** Standard uncertainties of the indices, by the same names. */
  u: Readonly<Record<string, number>>;
  birefringence: Readonly<{ value: number; u: number }> | null;
  twoVDeg: Readonly<{ value: number; u: number }> | null;
  orientation: ReadonlyArray<Readonly<{ facet: string; axes: readonly AxisOnFacet[] }>>;
  /** Root mean square of what was read less what this crystal would show. */
  rms: number;
  deltaChiSquared: number;
  /** What readings bound without determining it: β by one edge; of a uniaxial crystal how far apart its two equal indices may be (95 %). */
  bounds?: Readonly<{ betaAtLeast?: number; betaAtMost?: number; gapAtMost?: number }>;
}>;

export type Misfit = Readonly<{ facet: string; angleDeg: number; edge: "upper" | "lower" | "polariser"; /** In standard uncertainties. */ by: number; message: string }>;

export type RotationFit = Readonly<{
  solutions: readonly RotationSolution[];
  decided: boolean;
  /** What would decide, or what confirms, in words. */
  decideBy: string;
  outliers: readonly Misfit[];
  /** Readings a half turn apart that do not repeat: the stone moved, or its facet is not flat. */
  closure: readonly Misfit[];
  chiSquared: number;
  degreesOfFreedom: number;
  modelVersion: string;
}>;

export const rotationModelVersion = "rotation-2";
