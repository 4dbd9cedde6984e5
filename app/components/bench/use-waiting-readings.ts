import { useQuery } from "@tanstack/react-query";
import type { ReadingInstrument } from "#app/features/readings/reading-instrument.ts";
import type { KeptDeed } from "./outbox/outbox-store.ts";
import type { WaitingReading } from "./waiting-reading.ts";

const none: readonly WaitingReading[] = [];

/** What waits on this device, read as it will be once it is saved; the rotation fit comes with it, so it is loaded only then. */
export function useWaitingReadings(deeds: readonly KeptDeed[], instruments: ReadonlyArray<ReadingInstrument & { ref: string }>): readonly WaitingReading[] {
  const { data } = useQuery({
    queryKey: ["waiting-readings", deeds.map(({ place, refusal }) => [place, refusal])],
    queryFn: async () => (await import("./waiting-reading.ts")).waitingReadings(deeds, instruments),
    enabled: deeds.length > 0,
    networkMode: "always",
    retry: false,
    placeholderData: (previous) => previous,
  });
  return deeds.length > 0 ? (data ?? none) : none;
}
