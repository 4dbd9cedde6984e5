/** Moves with every change of the layout; kept beside the bytes that it made. */
export const reportTemplateVersion = "report-2";

export type ReportRow = Readonly<{
  label: string;
  /** In order; measured parts are set in the typewriter face. */
  parts: ReadonlyArray<Readonly<{ text: string; isMono?: boolean }>>;
}>;
/** Shadow edges against the stone's rotation on the refractometer, with the curves fitted to them. */
export type RotationPlot = Readonly<{
  /** "table facet", and the like. */
  facetLabel: string;
  points: ReadonlyArray<Readonly<{ angleDeg: number; index: number }>>;
  /** The upper edge first. */
  curves: ReadonlyArray<Readonly<{ label: string; points: ReadonlyArray<Readonly<{ angleDeg: number; index: number }>> }>>;
}>;
/** What another laboratory's document says: quoted as stated there, never taken over as a result. */
export type ExternalStatement = Readonly<{ issuer: string; number: string; onDate: string; statement: string }>;
export type ReportSignature = Readonly<{ name: string; title: string; statement: string; onDate: string }>;

/** Everything that a report says, as plain data frozen with it: dates are already written in the laboratory's zone. */
export type ReportView = Readonly<{
  kind: "identification" | "identificationWithValuation";
  laboratory: Readonly<{ name: string; mark: string; addressLines: readonly string[]; phone: string; email: string }>;
  number: string;
  version: number;
  reportOn: string;
  receivedOn: string;
  examinedOn: string;
  timeZone: string;
  clientName: string;
  /** Printed only on reports without a value: an address beside a value is an invitation to burglars. */
  clientContactLines?: readonly string[];
  stoneCode: string;
  receiptNumber: string;
  asReceived: string;
  conclusion: Readonly<{ title: string; statements: readonly string[]; confidence: string }>;
  description: readonly ReportRow[];
  observations: readonly ReportRow[];
  treatments: Readonly<{ found: readonly string[]; notFound: readonly string[]; notDeterminable: readonly string[]; stated: readonly string[] }>;
  evidence: string;
  natureEvidence: string;
  rejected: ReadonlyArray<Readonly<{ name: string; because: string }>>;
  limits: readonly string[];
  instruments: readonly string[];
  clientStatements: string;
  cautions: readonly string[];
  photograph: Readonly<{ caption: string; jpeg?: Uint8Array }> | null;
  rotationPlot?: RotationPlot | null;
  externalStatements?: readonly ExternalStatement[];
  /** In order of signing. With a valuation the last one is the appraiser's and stands with the value, not with the identity. */
  signatures: readonly ReportSignature[];
  verification: Readonly<{ url: string; code: string }>;
  amendment: Readonly<{ supersedesNumber: string; reason: string }> | null;
  versions: Readonly<{ speciesTable: string; rankingModel: string }>;
  /** ISO instant of the authorisation: the document's own date, so that the same view gives the same bytes. */
  authorisedAt: string;
  isDraft: boolean;
  valuation: ValuationView | null;
}>;

export type ValuationView = Readonly<{
  /** Which kind of appraisal report this is; a restricted one says to whom its use is restricted. */
  option?: Readonly<{ name: string; useRestriction: string }>;
  value: string;
  valueType: string;
  valueDefinition: string;
  valueDefinitionSource: string;
  facts: readonly ReportRow[];
  reasoning: string;
  otherApproaches: string;
  comparables: ReadonlyArray<Readonly<{ reference: string; description: string; onDate: string; price: string; adjustment: string; adjusted: string }>>;
  limitingConditions: readonly string[];
  certification: readonly string[];
}>;
