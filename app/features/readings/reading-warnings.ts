import { decimalPlaces, parseDecimal } from "#app/domain/decimal.ts";
import { massDifference } from "#app/features/custody/mass-difference.ts";
import type { ComposedReading } from "./compose-reading.ts";
import { weighingNotes } from "./weighing-notes.ts";

type WarnedInstrument = Readonly<{ name: string; status: "inService" | "restricted" | "outOfService"; statusReason: string; upperLimit: number | null; standardUncertainty: number | null }>;

/** What a colleague at the next bench would say of a reading that is kept all the same. */
export function readingWarnings({ reading, instrument, outOfCheck, earlierWeightText }: {
  reading: ComposedReading;
  instrument: WarnedInstrument | null;
  /** Why its instrument is out of check, in a sentence. */
  outOfCheck: string | null;
  /** Carats as last weighed; empty where the stone was not. */
  earlierWeightText: string;
}): string[] {
  if (reading.quality === "noResult") return [];
  const warnings: string[] = [];
  if (outOfCheck) warnings.push(`${outOfCheck} Until it is checked, this reading cannot carry “identified”.`);
  if (instrument?.status === "restricted") warnings.push(`${instrument.name} is restricted${instrument.statusReason ? `: ${instrument.statusReason}` : ""}.`);
  const limit = instrument?.upperLimit;
  const edge = reading.values.find(({ name }) => name === "high" || name === "n");
  if (limit && edge && reading.detail.kind !== "criticalAngle" && Math.abs(edge.value - limit) <= 0.01) {
    warnings.push("This is close to the contact liquid's own edge, which is sharp and stays still while the stone turns.");
  }
  const drift = weighingNotes(reading)?.drift;
  if (drift) warnings.push(drift);
  const weight = reading.values.find(({ name }) => name === "weightCt" || name === "massAirCt");
  if (weight && parseDecimal(earlierWeightText) !== undefined) {
    const { differenceCt, isAlarming } = massDifference({
      before: { massText: earlierWeightText, massUnit: "ct" },
      after: { massText: weight.value.toFixed(decimalPlaces(weight.typedText)), massUnit: "ct" },
      standardUncertaintyCt: instrument?.standardUncertainty ?? null,
    });
    if (isAlarming) warnings.push(`The stone weighed ${earlierWeightText} ct before: ${differenceCt > 0 ? "+" : "−"}${Math.abs(differenceCt).toFixed(3)} ct. Is it the same stone?`);
  }
  return warnings;
}
