import { and, asc, eq, isNotNull, isNull, or, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import { instrumentChecks, instruments, observationStrikes, observations, secondChecks, stones, users } from "#app/db/schema/index.ts";
import type { ReadingValue } from "#app/domain/reading.ts";
import { doubtColumns } from "#app/features/instruments/doubt-columns.server.ts";
import { readingDoubt } from "#app/features/instruments/reading-doubt.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { parseJsonRows } from "#app/features/stones/parse-json-rows.ts";
import type { ReadingView } from "./reading-view.ts";

const strikers = alias(users, "strikers");

/**
 * A stone's readings in the order they were made, struck ones in their places, in one query. Whoever is making a second
 * check sees their own alone until they compare; to everybody else a check's readings show once it was compared.
 */
export async function listReadings(ctx: LabContext, { stoneCode }: { stoneCode: string }): Promise<ReadingView[]> {
  requireRole(ctx, "readings.read");
  const { db, laboratoryId, actorId, laboratory } = ctx;
  const ownOpenCheck = sql`exists (select 1 from second_checks own where own.laboratory_id = ${stones.laboratoryId} and own.stone_id = ${stones.id}
    and own.checker_id = ${sql.param(actorId, secondChecks.checkerId)} and own.compared_at is null)`;
  const rows = await db
    .select({
      sequence: observations.sequence,
      detail: observations.detail,
      quality: observations.quality,
      noResultReason: observations.noResultReason,
      note: observations.note,
      isBlind: observations.isBlind,
      secondCheckId: observations.secondCheckId,
      observedAt: observations.observedAt,
      recordedAt: observations.recordedAt,
      observerId: observations.observerId,
      observer: users.name,
      instrument: { name: instruments.name, description: instruments.description },
      ...doubtColumns,
      check: { referenceMaterial: instrumentChecks.referenceMaterial, checkedAt: instrumentChecks.checkedAt },
      strike: { reason: observationStrikes.reason, struckAt: observationStrikes.struckAt },
      struckBy: strikers.name,
      // As text: MariaDB writes a decimal into JSON without its last zeros anyway, and 1.7620000 is read back exactly.
      values: sql<string | null>`(select json_arrayagg(json_object('name', v.name, 'value', cast(v.value as char), 'rawValue', cast(v.raw_value as char), 'typedText', v.typed_text, 'unit', v.unit,
        'standardUncertainty', cast(v.standard_uncertainty as char), 'formula', v.formula))
        from observation_values v where v.laboratory_id = ${observations.laboratoryId} and v.observation_id = ${observations.id})`,
    })
    .from(stones)
    .innerJoin(observations, and(eq(observations.laboratoryId, stones.laboratoryId), eq(observations.stoneId, stones.id)))
    .innerJoin(users, eq(users.id, observations.observerId))
    .leftJoin(instruments, and(eq(instruments.laboratoryId, observations.laboratoryId), eq(instruments.id, observations.instrumentId)))
    .leftJoin(instrumentChecks, and(eq(instrumentChecks.laboratoryId, observations.laboratoryId), eq(instrumentChecks.id, observations.instrumentCheckId)))
    .leftJoin(observationStrikes, and(eq(observationStrikes.laboratoryId, observations.laboratoryId), eq(observationStrikes.observationId, observations.id)))
    .leftJoin(strikers, eq(strikers.id, observationStrikes.struckBy))
    .leftJoin(secondChecks, and(eq(secondChecks.laboratoryId, observations.laboratoryId), eq(secondChecks.id, observations.secondCheckId)))
    .where(
      and(
        eq(stones.laboratoryId, laboratoryId),
        eq(stones.code, stoneCode),
        or(
          and(ownOpenCheck, eq(secondChecks.checkerId, actorId), isNull(secondChecks.comparedAt)),
          and(sql`not ${ownOpenCheck}`, or(isNull(observations.secondCheckId), isNotNull(secondChecks.comparedAt))),
        ),
      ),
    )
    .orderBy(asc(observations.sequence));
  return rows.map(({ secondCheckId, observerId, struckBy, strike, values, doubt, ...row }) => ({
    ...row,
    doubt: readingDoubt({ ...row, doubt }, laboratory.timeZone),
    isOfSecondCheck: secondCheckId !== null,
    isOwn: observerId === actorId,
    strike: strike && { ...strike, by: struckBy ?? "" },
    values: parseValues(values),
  }));
}

type ValueRow = Omit<ReadingValue, "value" | "rawValue" | "standardUncertainty"> & { value: string; rawValue: string | null; standardUncertainty: string | null };

function parseValues(json: string | ValueRow[] | null): ReadingValue[] {
  return parseJsonRows<ValueRow>(json).map((row) => ({ ...row, value: Number(row.value), rawValue: row.rawValue === null ? null : Number(row.rawValue), standardUncertainty: row.standardUncertainty === null ? null : Number(row.standardUncertainty) }));
}
