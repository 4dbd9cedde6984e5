import { AppError } from "#app/domain/app-error.ts";

/** A reading waits for the line over a long week end, not over months. */
const longestWaitMs = 14 * 24 * 60 * 60 * 1000;
/** What clocks of decent devices differ by. */
const fastMs = 5 * 60 * 1000;

/**
 * When a reading was made: by the device that kept it while there was no line, else now. Our own clock is kept beside it.
 *
 * @throws AppError where the device's clock cannot be right: ahead of ours by more than five minutes, or weeks behind
 */
export function observedAt({ madeAt, now }: { madeAt: Date | null; now: Date }): Date {
  if (madeAt === null) return now;
  const waitedMs = now.getTime() - madeAt.getTime();
  if (waitedMs < -fastMs || waitedMs > longestWaitMs) throw new AppError("invalid_input", "The clock of this device cannot be right: it is more than five minutes ahead, or two weeks behind. Set it, and record the reading again.");
  return waitedMs < 0 ? now : madeAt;
}
