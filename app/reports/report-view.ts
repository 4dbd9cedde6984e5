/** Moves with every change of the layout; kept beside the bytes that it made. */
export const reportTemplateVersion = "report-1";

export type ReportRow = Readonly<{
  label: string;
  /** In order; measured parts are set in the typewriter face. */
  parts: ReadonlyArray<Readonly<{ text: string; isMono?: boolean }>>;
}>;
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
