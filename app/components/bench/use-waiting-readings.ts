import { useEffect, useState } from "react";
import type { ReadingInstrument } from "#app/features/readings/reading-instrument.ts";
import type { KeptDeed } from "./outbox/outbox-store.ts";
import type { WaitingReading } from "./waiting-reading.ts";

const none: readonly WaitingReading[] = [];

/** What waits on this device, read as it will be once it is saved; the rotation fit comes with it, so it is loaded only then. */
export function useWaitingReadings(deeds: readonly KeptDeed[], instruments: ReadonlyArray<ReadingInstrument & { ref: string }>): readonly WaitingReading[] {
  const [readings, setReadings] = useState(none);
  useEffect(() => {
    if (deeds.length === 0) return;
    let isGone = false;
    void import("./waiting-reading.ts").then(({ waitingReadings }) => {
      if (!isGone) setReadings(waitingReadings(deeds, instruments));
    });
    return () => {
      isGone = true;
    };
  }, [deeds, instruments]);
  return deeds.length > 0 ? readings : none;
}
