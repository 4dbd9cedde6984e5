const hourMs = 3_600_000;

/** A sole practitioner looks again with fresh eyes: the earliest instant of a self-check (workflow 1.8, common practice). */
export function selfCheckFrom({ concludedAt, delayHours }: { concludedAt: Date; delayHours: number }): Date {
  return new Date(concludedAt.getTime() + delayHours * hourMs);
}
