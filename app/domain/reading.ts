import type { ConsentCode } from "./consent-code.ts";
import { describedKinds, isDescribed, testForms, type DescribedDetail, type DescribedKind, type DescribedNumber } from "./bench-tests/test-forms.ts";
import type { TestForm } from "./bench-tests/test-form.ts";
import type { RotationCrystal } from "#app/gemmology/ranking/evidence.ts";
import type { InstrumentKind } from "./instrument-kind.ts";

/** Tests whose forms are written out; the others are described in bench-tests/. */
export type WrittenKind = "refractometer" | "spot" | "overLimit" | "criticalAngle" | "rotation" | "polariscope" | "density" | "weight" | "dimensions" | "free";
/** The tests whose readings can be recorded, by what the instrument shows. */
export type ObservationKind = WrittenKind | DescribedKind;

type AboutTest = Pick<TestForm, "name" | "hotkey" | "instrumentKind" | "needsInstrument" | "evidenceClass" | "consent" | "caution">;
const contactLiquid = "The contact liquid is toxic and stains: a drop the size of a pinhead, gloves, air, and wash stone and hands after. Never on porous, organic, glued, foiled or lead-glass-filled stones.";
const onRefractometer = { instrumentKind: "refractometer", needsInstrument: true, evidenceClass: "index", consent: "contactLiquid", caution: contactLiquid } as const;

const writtenTests: Readonly<Record<WrittenKind, AboutTest>> = {
  refractometer: { name: "Refractometer", hotkey: "1", ...onRefractometer },
  spot: { name: "Spot reading", hotkey: "2", ...onRefractometer },
  overLimit: { name: "Over the limit", hotkey: "3", ...onRefractometer },
  criticalAngle: { name: "Critical angle", hotkey: "4", ...onRefractometer, instrumentKind: "angleRefractometer" },
  rotation: { name: "Rotation run", hotkey: "0", ...onRefractometer },
  polariscope: { name: "Polariscope", hotkey: "5", instrumentKind: "polariscope", needsInstrument: true, evidenceClass: "character", consent: null, caution: null },
  density: { name: "Density", hotkey: "6", instrumentKind: "balance", needsInstrument: true, evidenceClass: "density", consent: "hydrostatic", caution: "Not porous, strung, foil-backed or water-soluble stones." },
  weight: { name: "Weight", hotkey: "7", instrumentKind: "balance", needsInstrument: true, evidenceClass: null, consent: null, caution: null },
  dimensions: { name: "Dimensions", hotkey: "8", instrumentKind: "gauge", needsInstrument: true, evidenceClass: null, consent: null, caution: "Jaws chip girdles and opals: close them slowly." },
  free: { name: "Observation", hotkey: "9", instrumentKind: null, needsInstrument: false, evidenceClass: "seen", consent: null, caution: null },
};

/** Name, key, instrument, consent and caution of each test. */
export const aboutTest = (kind: ObservationKind): AboutTest => (isDescribed(kind) ? testForms[kind] : writtenTests[kind]);
const everyKind = [...(Object.keys(writtenTests) as WrittenKind[]), ...describedKinds];

/** The tests in the order of an examination: what harms least comes first (common practice). */
export const testGroups: ReadonlyArray<Readonly<{ name: string; kinds: readonly ObservationKind[]; /** For few stones only. */ isSeldom?: true }>> = [
  { name: "Look", kinds: ["appearance", "magnification", "free"] },
  { name: "Measure", kinds: ["weight", "dimensions", "density"] },
  { name: "Polars", kinds: ["polariscope", "dichroscope"] },
  { name: "Index", kinds: ["refractometer", "rotation", "spot", "overLimit", "criticalAngle"] },
  { name: "Light", kinds: ["spectroscope", "ultraviolet", "colourFilter"] },
  { name: "Over the limit", kinds: ["reflectivity", "brewster", "realDepth", "thermalProbe", "conductivity"], isSeldom: true },
  { name: "Last", kinds: ["magnet", "immersion", "heavyLiquid"], isSeldom: true },
];
export const observationKinds: readonly ObservationKind[] = testGroups.flatMap(({ kinds }) => kinds);

const byKind = <Value>(of: (about: AboutTest) => Value) => Object.fromEntries(everyKind.map((kind) => [kind, of(aboutTest(kind))])) as Readonly<Record<ObservationKind, Value>>;
export const observationKindNames = byKind(({ name }) => name);
/** Kinds whose evidence is independent of each other: a conclusion needs two of these classes (workflow 1.6). */
export const evidenceClassOf = byKind(({ evidenceClass }) => evidenceClass);
/** The kind of instrument that a test is read on; null where the eye is enough. */
export const instrumentKindFor: Readonly<Record<ObservationKind, InstrumentKind | null>> = byKind(({ instrumentKind }) => instrumentKind);
/** What the client must have agreed to before a test touches the stone (workflow 1.2, 1.4). */
export const consentNeededFor: Readonly<Record<ObservationKind, ConsentCode | null>> = byKind(({ consent }) => consent);

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
  | { kind: "rotation"; light: Light; /** As it was typed, a position a line. */ rows: string; character: RotationCharacter; sign: "+" | "-" | null; /** Every crystal that the run allows, with its weight. */ solutions: readonly RotationCrystal[] }
  | { kind: "polariscope"; behaviour: PolariscopeBehaviour; directionsTried: number; figure: InterferenceFigure; sign: "+" | "-" | null }
  | { kind: "density"; method: WeighingMethod }
  | { kind: "weight" }
  | { kind: "dimensions"; shape: "round" | "other" }
  | { kind: "free"; text: string }
  | DescribedDetail;

/** What a run of edges decides of the crystal; undetermined where one facet leaves several. */
export const rotationCharacters = ["isotropic", "uniaxial", "biaxial", "undetermined"] as const;
export type RotationCharacter = (typeof rotationCharacters)[number];

/**
 * One number of a reading. `value` is what was typed, read as a decimal, with the instrument's correction where one was
 * in force: then `rawValue` is what the instrument showed. Derived numbers name their formula.
 */
export type ReadingValue = Readonly<{
  name: ReadingValueName;
  value: number;
  rawValue?: number | null;
  typedText: string;
  unit: "n" | "deg" | "ct" | "g" | "mm" | "degC" | "kg/m3" | "cm" | "s" | "x" | "%" | "1";
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
  | "massAirCt2"
  | "massAirCt3"
  | "massLiquidCt2"
  | "massLiquidCt3"
  | "tempC"
  | "sg"
  | "weightCt"
  | "lengthMm"
  | "widthMm"
  | "depthMm"
  | "omega"
  | "epsilon"
  | "alpha"
  | "beta"
  | "gamma"
  | DescribedNumber;
