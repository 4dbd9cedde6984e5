import type { Confidence, ConclusionDescription, LimitCode, Nature, RejectedAlternative, TreatmentFinding } from "#app/domain/conclusion.ts";
import type { ConsentCode } from "#app/domain/consent-code.ts";
import type { Place } from "#app/domain/inclusion.ts";
import type { RecordInclusion } from "#app/features/inclusions/record-inclusion.server.ts";
import type { ReadingDraft } from "#app/features/readings/reading-draft.ts";
import type { GemOutline } from "../draw-gem-photo.ts";
import type { InventedBand } from "./invented-spectrum.ts";

export type ClientKey = "ardenne" | "ferro" | "castellan" | "holm" | "museum";
export type Reading = { draft: ReadingDraft; instrument: string | null; note?: string; struckBecause?: string };

export type Conclusion = {
  speciesName: string;
  variety?: string;
  nature: Nature;
  natureEvidence: string;
  confidence?: Confidence;
  treatments?: TreatmentFinding[];
  evidence: string;
  rejected: RejectedAlternative[];
  limits?: LimitCode[];
  contradictionsExplained?: string;
  description: Partial<ConclusionDescription>;
};

/** What becomes of a stone, told as the product's own steps. */
export type Story = {
  description: string;
  photo: { outline: GemOutline; hue: string; lengthMm: number } | null;
  client: ClientKey;
  /** Taken in so many days before now. */
  daysAgo: number;
  mount?: "loose" | "mounted" | "strung";
  mass: string;
  stoneCount?: number;
  massUnit?: "ct" | "g";
  condition?: string;
  declared?: number;
  isValuationWanted?: boolean;
  statements?: string;
  consents?: ConsentCode[];
  readings?: Reading[];
  /** A measured spectrum, invented from its bands. */
  spectrum?: { title: string; note: string; bands: readonly InventedBand[] };
  /** What was plotted; a place on the photograph only where the story has one. */
  inclusions?: ReadonlyArray<Pick<RecordInclusion, "type" | "depth" | "amount" | "note"> & { sizeMm?: string; onPlot: Place; onPhoto?: Place; struckBecause?: string }>;
  conclusion?: Conclusion;
  check?: { readings: Reading[]; outcome?: "agreed" | "returned"; reason?: string };
  valuation?: "draft" | "signed";
  report?: "authorised" | "issued" | "withdrawn" | "superseded";
  isPaid?: boolean;
  isReleased?: boolean;
};
