import type { ReadingDoubt } from "#app/features/instruments/reading-doubt.ts";
import type { ReadingDetail, ReadingQuality, ReadingValue } from "#app/domain/reading.ts";

/** A reading as its stone's page shows it. */
export type ReadingView = Readonly<{
  /** Its number within the stone; stays when it is struck. */
  sequence: number;
  detail: ReadingDetail;
  quality: ReadingQuality;
  noResultReason: string;
  note: string;
  isBlind: boolean;
  isOfSecondCheck: boolean;
  observedAt: Date;
  /** By our own clock, when it came; later where it waited on a device. */
  recordedAt: Date;
  observer: string;
  isOwn: boolean;
  instrument: { name: string; description: string } | null;
  check: { referenceMaterial: string; checkedAt: Date } | null;
  values: readonly ReadingValue[];
  /** Why its instrument was not known to be right when it was made; null where it was. */
  doubt: ReadingDoubt | null;
  strike: { reason: string; struckAt: Date; by: string } | null;
}>;
