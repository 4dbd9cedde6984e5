import { evidenceClassOf, type ObservationKind, type ReadingQuality } from "#app/domain/reading.ts";

type OwnReading = Readonly<{ detail: { kind: ObservationKind }; quality: ReadingQuality; strike: unknown }>;

/** What is missing before a checker may compare: at least one optical reading and one of another test, all their own (workflow 1.8). */
export function ownReadingsProblem(readings: readonly OwnReading[]): string | undefined {
  const kinds = new Set(readings.filter(({ quality, strike }) => quality !== "noResult" && !strike).map(({ detail }) => detail.kind));
  const isOptical = (kind: ObservationKind) => evidenceClassOf[kind] === "index" || evidenceClassOf[kind] === "character";
  if (![...kinds].some(isOptical)) return "Record an optical reading of your own first: refractometer, spot, critical angle or polariscope.";
  if (kinds.size < 2) return "Record one more reading of your own first, by another test.";
  return undefined;
}
