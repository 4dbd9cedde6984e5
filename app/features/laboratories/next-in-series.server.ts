import { and, eq, sql } from "drizzle-orm";
import { seriesCounters } from "#app/db/schema/index.ts";
import type { LabScope } from "#app/features/lab-context.ts";

/**
 * The next number of a series in a year. Must run inside the transaction that uses the number: the row stays locked
 * until it commits, and a rollback gives the number back, so the series has neither gaps nor repeats.
 */
export async function nextInSeries(scope: LabScope, { series, year }: { series: "item" | "takeIn" | "report" | "invoice"; year: number }): Promise<number> {
  await scope.db
    .insert(seriesCounters)
    .values({ laboratoryId: scope.laboratoryId, series, year, lastValue: 1 })
    .onDuplicateKeyUpdate({ set: { lastValue: sql`${seriesCounters.lastValue} + 1` } });
  const [row] = await scope.db
    .select({ lastValue: seriesCounters.lastValue })
    .from(seriesCounters)
    .where(and(eq(seriesCounters.laboratoryId, scope.laboratoryId), eq(seriesCounters.series, series), eq(seriesCounters.year, year)))
    .for("update");
  if (!row) throw new Error(`no counter for ${series} ${year} inside its own transaction`);
  return row.lastValue;
}
