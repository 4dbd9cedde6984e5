import type { ConsentCode } from "./consent-code.ts";

/** The tests whose readings can be recorded, by what the instrument shows. */
export const observationKinds = [
  "refractometer",
  "spot",
  "overLimit",
  "criticalAngle",
  "polariscope",
  "density",
  "weight",
  "dimensions",
  "free",
] as const;
export type ObservationKind = (typeof observationKinds)[number];

export const observationKindNames: Readonly<Record<ObservationKind, string>> = {
  refractometer: "Refractometer",
  spot: "Spot reading",
  overLimit: "Over the limit",
  criticalAngle: "Critical angle",
  polariscope: "Polariscope",
  density: "Density",
  weight: "Weight",
  dimensions: "Dimensions",
  free: "Observation",
};

/** Kinds whose evidence is independent of each other: a conclusion needs two of these classes (workflow 1.6). */
export const evidenceClassOf: Readonly<Record<ObservationKind, "index" | "character" | "density" | "seen" | null>> = {
  refractometer: "index",
  spot: "index",
  overLimit: "index",
  criticalAngle: "index",
  polariscope: "character",
  density: "density",
  weight: null,
  dimensions: null,
  free: "seen",
};

/** The kind of instrument that a test is read on; null where the eye is enough. */
export const instrumentKindFor = {
  refractometer: "refractometer",
  spot: "refractometer",
  overLimit: "refractometer",
  criticalAngle: "angleRefractometer",
  polariscope: "polariscope",
  density: "balance",
  weight: "balance",
  dimensions: "gauge",
  free: null,
} as const satisfies Record<ObservationKind, string | null>;

/** What the client must have agreed to before a test touches the stone (workflow 1.2, 1.4). */
export const consentNeededFor: Readonly<Record<ObservationKind, ConsentCode | null>> = {
  refractometer: "contactLiquid",
  spot: "contactLiquid",
  overLimit: "contactLiquid",
  criticalAngle: "contactLiquid",
  polariscope: null,
  density: "hydrostatic",
  weight: null,
  dimensions: null,
  free: null,
};

export const readingQualities = ["good", "fair", "poor", "noResult"] as const;
export type ReadingQuality = (typeof readingQualities)[number];
export const readingQualityNames: Readonly<Record<ReadingQuality, string>> = {
  good: "Good",
  fair: "Fair",
  poor: "Poor",
  noResult: "No reading",
};

export const noResultReasons = [
  "not attempted",
  "not applicable",
  "consent refused",
  "over the limit",
  "poor polish",
  "too small",
  "mount blocks",
  "instrument out of service",
  "ambiguous",
] as const;

export const facets = ["table", "crown", "pavilion", "dome", "base", "other"] as const;
export type Facet = (typeof facets)[number];
export const facetNames: Readonly<Record<Facet, string>> = {
  table: "Table",
  crown: "Crown",
  pavilion: "Pavilion",
  dome: "Dome",
  base: "Base",
  other: "Another facet",
};

export const lights = ["sodium", "filteredYellow", "white"] as const;
export type Light = (typeof lights)[number];
export const lightNames: Readonly<Record<Light, string>> = {
  sodium: "Na 589.3 nm",
  filteredYellow: "Filtered yellow",
  white: "White, at the yellow–green edge",
};

export const polariscopeBehaviours = ["dark", "blinks", "staysLight", "anomalous", "cannotTell"] as const;
export type PolariscopeBehaviour = (typeof polariscopeBehaviours)[number];
export const polariscopeBehaviourNames: Readonly<Record<PolariscopeBehaviour, string>> = {
  dark: "Dark throughout the turn",
  blinks: "Light and dark four times in a turn",
  staysLight: "Stays light throughout the turn",
  anomalous: "Patchy, snaking or cross-hatched",
  cannotTell: "Cannot tell",
};

export const interferenceFigures = ["notSought", "none", "uniaxial", "uniaxialHollowCentre", "biaxial"] as const;
export type InterferenceFigure = (typeof interferenceFigures)[number];
export const interferenceFigureNames: Readonly<Record<InterferenceFigure, string>> = {
  notSought: "Not sought",
  none: "None found",
  uniaxial: "Uniaxial: cross with rings",
  uniaxialHollowCentre: "Uniaxial: cross with a hollow centre",
  biaxial: "Biaxial: one or two brushes",
};

export const weighingMethods = ["suspended", "beakerOnPan"] as const;
export type WeighingMethod = (typeof weighingMethods)[number];
export const weighingMethodNames: Readonly<Record<WeighingMethod, string>> = {
  suspended: "Stone hung in water, weighed",
  beakerOnPan: "Stone hung free, beaker of water weighed",
};

export const spotMethods = ["50/50", "blink", "average"] as const;
export type SpotMethod = (typeof spotMethods)[number];
export const spotMethodNames: Readonly<Record<SpotMethod, string>> = {
  "50/50": "Spot half dark",
  blink: "Blink from dark to light",
  average: "Mean of the two",
};

/** Conditions and things seen, in the vocabulary of each kind. Numbers are kept beside, with the digits as typed. */
export type ReadingDetail =
  | { kind: "refractometer"; edges: "two" | "one"; isRotated: boolean; facet: Facet; light: Light }
  | { kind: "spot"; method: SpotMethod; facet: Facet; light: Light }
  | { kind: "overLimit"; facet: Facet; light: Light }
  | { kind: "criticalAngle"; facet: Facet; light: Light }
  | { kind: "polariscope"; behaviour: PolariscopeBehaviour; directionsTried: number; figure: InterferenceFigure; sign: "+" | "-" | null }
  | { kind: "density"; method: WeighingMethod }
  | { kind: "weight" }
  | { kind: "dimensions"; shape: "round" | "other" }
  | { kind: "free"; text: string };

/**
 * One number of a reading. `value` is what was typed, read as a decimal, with the instrument's correction where one was
 * in force: then `rawValue` is what the instrument showed. Derived numbers name their formula.
 */
export type ReadingValue = Readonly<{
  name: ReadingValueName;
  value: number;
  rawValue?: number | null;
  typedText: string;
  unit: "n" | "deg" | "ct" | "g" | "mm" | "degC" | "kg/m3" | "1";
  standardUncertainty: number | null;
  formula: string | null;
}>;

export type ReadingValueName =
  | "low"
  | "high"
  | "n"
  | "limit"
  | "angleDeg"
  | "prismN"
  | "birefringence"
  | "massAirCt"
  | "massLiquidCt"
  | "tempC"
  | "sg"
  | "weightCt"
  | "lengthMm"
  | "widthMm"
  | "depthMm";
