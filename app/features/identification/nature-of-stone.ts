import { natureEvidence, type NatureEvidence } from "#app/gemmology/nature/nature-evidence.ts";
import { beyondBench, referralReasons } from "#app/gemmology/nature/referral.ts";
import { seenFeatures } from "#app/features/readings/seen-evidence.ts";
import type { NumberedReading } from "./rank-readings.ts";
import type { BenchRanking } from "./bench-ranking.ts";

export type NatureOfStone = NatureEvidence & Readonly<{ speciesName: string | null; beyondBench: readonly string[]; referral: readonly string[] }>;

/** What the observations that stand say of nature and treatment, taking the stone for its likeliest species. */
export function natureOfStone(readings: readonly (NumberedReading & { note: string; strike: unknown })[], { candidates }: BenchRanking): NatureOfStone {
  const first = candidates[0] && candidates[0].probability > 0.5 ? candidates[0] : null;
  const texts = readings.filter(({ strike, quality }) => !strike && quality !== "noResult").flatMap(({ detail, note }) => [...seenTexts(detail), note].filter(Boolean));
  const evidence = natureEvidence({ speciesId: first?.speciesId ?? null, texts });
  return { ...evidence, speciesName: first?.name ?? null, beyondBench: beyondBench(first?.speciesId ?? null), referral: referralReasons({ speciesId: first?.speciesId ?? null, variety: null, hasConflict: evidence.conflicts.length > 0 }) };
}

/** What an observer wrote or ticked; a tick says what its label says. */
function seenTexts(detail: NumberedReading["detail"]): string[] {
  switch (detail.kind) {
    case "free":
      return [detail.text];
    case "magnification":
      return [...seenFeatures(detail), detail.text];
    case "immersion":
      return [detail.text];
    default:
      return [];
  }
}
