import { observationKinds, type ObservationKind } from "#app/domain/reading.ts";

/** What an observer means to record before they see candidates, and from which reading on it counts. */
export type ReadingPlan = Readonly<{ kinds: readonly ObservationKind[]; sinceSequence: number }>;
type Own = Readonly<{ sequence: number; detail: { kind: ObservationKind }; isOwn: boolean; strike: unknown }>;

export function planFromSearch(search: URLSearchParams): ReadingPlan {
  const asked = new Set(search.getAll("plan"));
  const since = Number(search.get("since") ?? "0");
  return { kinds: observationKinds.filter((kind) => asked.has(kind)), sinceSequence: Number.isSafeInteger(since) && since > 0 ? since : 0 };
}

/** The tests of a plan that are not recorded yet; one that gave no reading is recorded, one that was struck is not. */
export function planLeft({ kinds, sinceSequence }: ReadingPlan, readings: readonly Own[]): ObservationKind[] {
  const made = new Set(readings.filter(({ sequence, isOwn, strike }) => isOwn && !strike && sequence > sinceSequence).map(({ detail }) => detail.kind));
  return kinds.filter((kind) => !made.has(kind));
}

/** The plan as search parameters, to go along from test to test. */
export function planSearch({ kinds, sinceSequence }: ReadingPlan): string {
  return kinds.length === 0 ? "" : `&${new URLSearchParams([...kinds.map((kind): [string, string] => ["plan", kind]), ["since", String(sinceSequence)]])}`;
}
