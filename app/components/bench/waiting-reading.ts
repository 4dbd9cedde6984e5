import { composeAnyReading } from "#app/features/readings/compose-any-reading.ts";
import type { ComposedReading } from "#app/features/readings/compose-reading.ts";
import { readingDraftFromForm } from "#app/features/readings/reading-draft.ts";
import type { ReadingInstrument } from "#app/features/readings/reading-instrument.ts";
import type { KeptDeed } from "./outbox/outbox-store.ts";

/** A reading that waits, as it will read once it is saved. */
export type WaitingReading = Readonly<{ id: string; reading: ComposedReading; noResultReason: string; isStruck: boolean }>;

/** Readings out of what waits; a deed that cannot be read any more is left to the list, which shows its words. */
export function waitingReadings(deeds: readonly KeptDeed[], instruments: ReadonlyArray<ReadingInstrument & { ref: string }>): WaitingReading[] {
  const struck = new Set(deeds.flatMap(({ kind, fields }) => (kind === "strike" ? fields.flatMap(([name, value]) => (name === "named.requestId" ? [value] : [])) : [])));
  return deeds.flatMap(({ id, kind, fields }) => {
    if (kind !== "reading") return [];
    const form = new FormData();
    for (const [name, value] of fields) form.append(name, value);
    const instrument = instruments.find(({ ref }) => ref === form.get("instrument")) ?? null;
    const { reading } = composeAnyReading(readingDraftFromForm(form), instrument);
    return reading ? [{ id, reading, noResultReason: String(form.get("noResultReason") ?? ""), isStruck: struck.has(id) }] : [];
  });
}
