import { composeReading, type Composed } from "./compose-reading.ts";
import { composeRotation } from "./compose-rotation.ts";
import type { ReadingDraft } from "./reading-draft.ts";
import type { ReadingInstrument } from "./reading-instrument.ts";

/** A reading of any test, the rotation run's fit at hand. */
export function composeAnyReading(draft: ReadingDraft, instrument: ReadingInstrument | null): Composed {
  return draft.kind === "rotation" ? composeRotation(draft, instrument) : composeReading(draft, instrument);
}
