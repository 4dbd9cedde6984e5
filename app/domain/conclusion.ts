/** What kind of thing it is, in the words of the trade's nomenclature (wording.md §2: CIBJO, FTC 16 CFR 23.25, ISO 18323). */
export const natures = ["natural", "synthetic", "artificial", "composite", "reconstituted", "imitation", "organic", "cultured", "undetermined"] as const;
export type Nature = (typeof natures)[number];
export const natureNames: Readonly<Record<Nature, string>> = {
  natural: "Natural",
  synthetic: "Synthetic",
  artificial: "Artificial product",
  composite: "Composite",
  reconstituted: "Reconstituted",
  imitation: "Imitation",
  organic: "Natural organic material",
  cultured: "Cultured",
  undetermined: "Not determined",
};

export const confidences = ["identified", "consistentWith", "groupOnly", "notDetermined"] as const;
export type Confidence = (typeof confidences)[number];
export const confidenceNames: Readonly<Record<Confidence, string>> = {
  identified: "Identified",
  consistentWith: "Consistent with",
  groupOnly: "Group only",
  notDetermined: "Not determined",
};

export const treatmentStatuses = ["detected", "indications", "notDetected", "notDeterminable", "statedByClient"] as const;
export type TreatmentStatus = (typeof treatmentStatuses)[number];
export const treatmentStatusNames: Readonly<Record<TreatmentStatus, string>> = {
  detected: "Detected",
  indications: "Indications found",
  notDetected: "Not detected by the methods used",
  notDeterminable: "Not determinable by the methods used",
  statedByClient: "Stated by the client",
};

/** Treatments by their codes (wording.md §7), each with the words a report uses. */
export const treatmentNames = {
  heating: "Heating",
  heatingResidues: "Heating with residues in fissures",
  fluxHealing: "Flux-healed fissures",
  latticeDiffusion: "Lattice diffusion",
  surfaceDiffusion: "Surface diffusion",
  irradiation: "Irradiation",
  hpht: "High pressure and high temperature",
  laserDrilling: "Laser drilling",
  oilOrResinFilling: "Oil, wax or resin in fissures",
  glassFilling: "Glass in fissures or cavities",
  dyeing: "Dyeing",
  bleaching: "Bleaching",
  waxing: "Waxing",
  impregnation: "Impregnation with polymer",
  coating: "Coating, foil or backing",
  other: "Other treatment",
} as const;
export type TreatmentCode = keyof typeof treatmentNames;
export const treatmentCodes = Object.keys(treatmentNames) as TreatmentCode[];

export const treatmentExtents = ["none", "minor", "moderate", "significant"] as const;
export type TreatmentExtent = (typeof treatmentExtents)[number];

export type TreatmentFinding = Readonly<{ code: TreatmentCode; status: TreatmentStatus; extent: TreatmentExtent | null; evidence: string }>;
export type RejectedAlternative = Readonly<{ name: string; because: string }>;

/** What the report says of the stone's appearance: neutral words of wording.md §§3–5. */
export type ConclusionDescription = Readonly<{
  shape: string;
  cut: string;
  transparency: string;
  colour: string;
  colourLight: string;
  phenomenon: string;
  condition: string;
}>;

/** Codes of the limits block (wording.md §1), each with the words a report uses. */
export const limitNames = {
  mounted: "Examined as mounted; the setting limits what can be seen and measured.",
  closedBack: "Examined in a closed-back setting.",
  partialView: "Only part of the stone could be seen.",
  size: "The size of the stone limits the precision of the measurements.",
  surfaceDamage: "Surface damage limits the observations.",
  uncleaned: "Residues on the surface were not removed.",
  consentRefused: "A test was not done because consent to it was not given.",
  benchOnly: "Examined with bench instruments only.",
  treatmentNotDeterminable: "Some treatments cannot be determined with the methods used; they are listed.",
  massEstimated: "The mass is estimated by measurement.",
  originNotExamined: "Geographic origin was not examined.",
} as const;
export type LimitCode = keyof typeof limitNames;
export const limitCodes = Object.keys(limitNames) as LimitCode[];
