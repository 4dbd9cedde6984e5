import type { FieldErrors } from "#app/domain/app-error.ts";
import type { Confidence, Nature, RejectedAlternative, TreatmentFinding } from "#app/domain/conclusion.ts";
import { evidenceClassOf, observationKindNames, type ReadingDetail, type ReadingQuality } from "#app/domain/reading.ts";
import type { ReadingDoubt } from "#app/features/instruments/reading-doubt.ts";
import { characterOf } from "#app/features/readings/optic-character.ts";

type GatedReading = Readonly<{ sequence: number; detail: ReadingDetail; quality: ReadingQuality; strike: unknown; doubt?: ReadingDoubt | null }>;
type DoubtfulReading = GatedReading & { doubt: ReadingDoubt };
type GatedDraft = Readonly<{
  speciesName: string;
  nature: Nature;
  natureEvidence: string;
  confidence: Confidence;
  treatments: readonly TreatmentFinding[];
  rejected: readonly RejectedAlternative[];
  contradictionsExplained: string;
}>;

export type Contradiction = Readonly<{ sequence: number; because: string }>;

/** The kinds of evidence that stand, independent of each other; poor readings alone make none. */
export function evidenceClasses(readings: readonly GatedReading[]): Set<"index" | "character" | "density" | "spectrum" | "seen"> {
  const counted = readings.filter(({ quality, strike, detail }) => (quality === "good" || quality === "fair") && !strike && !(detail.kind === "polariscope" && !characterOf(detail)));
  return new Set(counted.flatMap(({ detail }) => evidenceClassOf[detail.kind] ?? []));
}

/** Readings that stand, tell of the identity, and were made on an instrument that was not known to be right. */
export function doubtfulReadings<Reading extends GatedReading>(readings: readonly Reading[]): Array<Reading & DoubtfulReading> {
  return readings.filter((reading): reading is Reading & DoubtfulReading => Boolean(reading.doubt) && !reading.strike && reading.quality !== "noResult" && evidenceClassOf[reading.detail.kind] !== null);
}

function doubtMessage({ sequence, detail, doubt }: DoubtfulReading): string {
  const remedy = doubt.because === "failedAfter" ? "Answer for it on the recall list" : `Check ${doubt.instrument}`;
  return `“Identified” cannot rest on reading ${sequence} (${observationKindNames[detail.kind].toLowerCase()} on ${doubt.instrument}). ${doubt.text} ${remedy}, or measure again on an instrument in check and strike this reading, or conclude otherwise than “Identified”.`;
}

/**
 * What stands against a conclusion, a sentence a field; nothing where it may be drawn. Two independent kinds of evidence
 * are the least, one of them measured before anything is called identified, none of it on an instrument out of check; a good reading that contradicts it is
 * explained; the nature has evidence of its own, which no constant gives (workflow 1.6).
 *
 * @param contradictions the good readings that contradict the species concluded, by the ranking's own words
 */
export function conclusionGate(readings: readonly GatedReading[], contradictions: readonly Contradiction[], draft: GatedDraft): FieldErrors {
  const problems: Record<string, string[]> = {};
  const refuse = (field: string, message: string) => void (problems[field] ??= []).push(message);
  const classes = evidenceClasses(readings);
  if (classes.size < 2) {
    refuse("evidence", `A conclusion needs two independent kinds of evidence; ${classes.size === 0 ? "there is none yet" : `so far there is ${classWords[[...classes][0]!]} alone`}. Record another test first.`);
  } else if (draft.confidence === "identified" && !classes.has("index") && !classes.has("density")) {
    refuse("confidence", "Nothing was measured yet: an index or a density comes before “identified”.");
  }
  if (draft.confidence === "identified") for (const reading of doubtfulReadings(readings)) refuse("confidence", doubtMessage(reading));
  if (contradictions.length > 0 && draft.contradictionsExplained.trim() === "") {
    const named = contradictions.map(({ sequence, because }) => `reading ${sequence} (${because})`).join("; ");
    refuse("contradictionsExplained", `A good reading contradicts ${draft.speciesName}: ${named}. Strike it with its reason, or explain here why it does not stand against the conclusion.`);
  }
  if (needsNatureEvidence.has(draft.nature) && draft.natureEvidence.trim() === "") {
    refuse("natureEvidence", "Index and density cannot tell natural from synthetic: write what was seen that does, or choose “Not determined”.");
  }
  if (draft.nature === "undetermined" && draft.confidence === "identified" && draft.natureEvidence.trim() === "") {
    refuse("natureEvidence", "Write why the nature could not be determined.");
  }
  if (draft.confidence !== "notDetermined") {
    if (draft.rejected.length === 0) refuse("rejected", "Name at least one alternative that was ruled out, and why.");
    if (draft.nature === "natural" && draft.treatments.length === 0) refuse("treatments", "A silent treatment field misleads: say of at least one treatment what was found, not found, or cannot be determined here.");
  }
  return problems;
}

const needsNatureEvidence: ReadonlySet<Nature> = new Set(["natural", "synthetic", "composite", "reconstituted", "cultured"]);
const classWords = { index: "the refractive index", character: "the optic character", density: "the density", spectrum: "the spectrum", seen: "what was seen" } as const;
