import { and, eq, sql } from "drizzle-orm";
import { clients, items, secondChecks, stones, takeIns, users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import type { Nature } from "#app/domain/conclusion.ts";
import type { ConsentCode } from "#app/domain/consent-code.ts";
import type { Id } from "#app/domain/ids.ts";
import type { InstrumentKind } from "#app/domain/instrument-kind.ts";
import { scaleUnitsOf, type ScaleUnit } from "#app/domain/instrument-scale.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { AppliedCorrection } from "#app/features/instruments/apply-correction.ts";
import { outOfCheck } from "#app/features/instruments/check-standing.ts";
import { latestFailure } from "#app/features/instruments/instrument-standing.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import type { ReadingView } from "#app/features/readings/reading-view.ts";
import { requireRole } from "#app/features/require-role.ts";
import { hasHandIn } from "#app/features/second-checks/has-hand-in.ts";
import { selfCheckFrom } from "#app/features/second-checks/self-check-from.ts";
import type { Correction } from "#app/gemmology/calibration/correction.ts";
import { parseJsonRows } from "./parse-json-rows.ts";

export type BenchInstrument = Readonly<{
  ref: string;
  kind: InstrumentKind;
  name: string;
  description: string;
  status: "inService" | "restricted";
  resolution: number | null;
  standardUncertainty: number | null;
  upperLimit: number | null;
  prismIndex: number | null;
  check: { referenceMaterial: string; checkedOn: string; nextDueOn: string; deviation: number | null } | null;
  /** Why it is out of check, in a sentence; null where it is in check or needs none. */
  outOfCheck: string | null;
  isOutOfCheck: boolean;
  /** What is added to its readings now; null where nothing is. */
  correction: AppliedCorrection | null;
}>;

export type CheckView = Readonly<{
  kind: "secondCheck" | "selfCheck";
  checker: string;
  isOwn: boolean;
  startedAt: Date;
  comparedAt: Date | null;
  outcome: "agreed" | "returned" | null;
  /** Empty to a checker who has not compared yet. */
  reason: string;
  /** What the checker said before they compared. */
  own: { species: string; nature: Nature } | null;
}>;

/**
 * One stone's page in two queries: how it stands, and its readings by the rules of who may see them. Without the right
 * to read readings (the desk) there are none, nor instruments. Declared values are never here.
 */
export async function getBench(ctx: LabContext, { stoneCode }: { stoneCode: string }) {
  requireRole(ctx, "stones.read");
  const seesReadings = isAllowed(ctx.roles, "readings.read");
  const [head, readings] = await Promise.all([getStoneHead(ctx, { stoneCode }), seesReadings ? listReadings(ctx, { stoneCode }) : Promise.resolve<ReadingView[] | null>(null)]);
  return { ...head, readings };
}
export type Bench = Awaited<ReturnType<typeof getBench>>;

/** How one stone stands, in one query; without its readings. */
export async function getStoneHead(ctx: LabContext, { stoneCode }: { stoneCode: string }) {
  requireRole(ctx, "stones.read");
  const { db, laboratoryId, actorId, roles, laboratory } = ctx;
  const seesReadings = isAllowed(roles, "readings.read");
  const actor = sql.param(actorId, secondChecks.checkerId);
  const [row] = await db
    .select({
      code: stones.code,
      sequence: stones.sequence,
      description: stones.description,
      state: stones.examinationState,
      goodsState: stones.goodsState,
      place: stones.place,
      weightText: stones.weightText,
      isMounted: stones.isMounted,
      isValuationOrdered: stones.isValuationOrdered,
      dueOn: stones.dueOn,
      photoId: stones.photoId,
      version: stones.version,
      examinerId: stones.examinerId,
      stoneCount: items.stoneCount,
      mount: items.mount,
      condition: items.condition,
      itemMass: sql<string>`concat(${items.massText}, ' ', ${items.massUnit})`,
      client: clients.name,
      clientId: clients.id,
      takeInNumber: takeIns.number,
      holder: sql<string | null>`(select h.name from users h where h.id = ${stones.holderId})`,
      examiner: users.name,
      hasHand: hasHandIn(actorId),
      consents: sql<string | null>`(select json_arrayagg(c.code) from item_consents c where c.laboratory_id = ${items.laboratoryId} and c.item_id = ${items.id} and c.is_given)`,
      conclusion: sql<string | null>`(select json_arrayagg(json_object('version', k.version, 'concludedAt', date_format(k.concluded_at, '%Y-%m-%dT%H:%i:%s.%fZ'), 'by', p.name, 'isOwn', k.concluded_by = ${actor}, 'speciesName', k.species_name, 'variety', k.variety, 'nature', k.nature))
        from conclusions k join users p on p.id = k.concluded_by where k.laboratory_id = ${stones.laboratoryId} and k.stone_id = ${stones.id})`,
      checks: sql<string | null>`(select json_arrayagg(json_object('version', k.version, 'kind', s.kind, 'checker', p.name, 'isOwn', s.checker_id = ${actor}, 'startedAt', date_format(s.started_at, '%Y-%m-%dT%H:%i:%s.%fZ'),
        'comparedAt', date_format(s.compared_at, '%Y-%m-%dT%H:%i:%s.%fZ'), 'outcome', s.outcome, 'reason', s.reason, 'ownSpecies', s.own_species, 'ownNature', s.own_nature))
        from second_checks s join users p on p.id = s.checker_id join conclusions k on k.laboratory_id = s.laboratory_id and k.id = s.conclusion_id
        where s.laboratory_id = ${stones.laboratoryId} and s.stone_id = ${stones.id})`,
      instruments: seesReadings
        ? sql<string | null>`(select json_arrayagg(json_object('id', hex(i.id), 'kind', i.kind, 'name', i.name, 'description', i.description, 'status', i.status, 'resolution', cast(i.resolution as char),
            'scaleUnit', i.scale_unit, 'hasChecks', exists (select 1 from instrument_checks k where k.laboratory_id = i.laboratory_id and k.instrument_id = i.id),
            'failing', (select json_arrayagg(k.reference_material) from instrument_checks k where k.laboratory_id = i.laboratory_id and k.instrument_id = i.id and ${latestFailure}),
            'correction', (select c.correction from instrument_corrections c where c.laboratory_id = i.laboratory_id and c.instrument_id = i.id and c.ended_at is null order by c.from_at desc, c.id desc limit 1),
            'standardUncertainty', cast(i.standard_uncertainty as char), 'upperLimit', cast(i.upper_limit as char), 'prismIndex', cast(i.prism_index as char),
            'check', (select json_object('referenceMaterial', k.reference_material, 'checkedAt', date_format(k.checked_at, '%Y-%m-%dT%H:%i:%s.%fZ'), 'nextDueOn', k.next_due_on, 'deviation', cast(coalesce(k.corrected_value, k.reading_value) - k.nominal_value as char))
              from instrument_checks k where k.laboratory_id = i.laboratory_id and k.instrument_id = i.id and k.is_passed order by k.checked_at desc limit 1)) order by i.name)
            from instruments i where i.laboratory_id = ${stones.laboratoryId} and i.status <> 'outOfService')`
        : sql<null>`null`,
    })
    .from(stones)
    .innerJoin(items, and(eq(items.laboratoryId, stones.laboratoryId), eq(items.id, stones.itemId)))
    .innerJoin(takeIns, and(eq(takeIns.laboratoryId, stones.laboratoryId), eq(takeIns.id, stones.takeInId)))
    .innerJoin(clients, and(eq(clients.laboratoryId, stones.laboratoryId), eq(clients.id, stones.clientId)))
    .leftJoin(users, eq(users.id, stones.examinerId))
    .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)));
  if (!row) throw new AppError("not_found", "There is no such stone.");

  const { photoId, clientId, examinerId, hasHand, consents, conclusion, checks, instruments, ...stone } = row;
  const latest = parseJsonRows<ConclusionRow>(conclusion).sort((a, b) => b.version - a.version)[0];
  const check = parseJsonRows<CheckRow>(checks).find(({ version }) => version === latest?.version);
  const isInvolved = examinerId === actorId || Boolean(Number(hasHand)) || Boolean(latest && Number(latest.isOwn));
  const today = calendarDateIn(ctx.now, laboratory.timeZone);
  const concludedAt = latest ? new Date(latest.concludedAt) : null;
  const isCheckerBlind = Boolean(check && Number(check.isOwn) && check.comparedAt === null);
  return {
    // The last weight is the first examiner's reading: a checker weighs for themselves.
    stone: { ...stone, weightText: isCheckerBlind ? "" : stone.weightText, photoRef: photoId && shortRef(photoId), clientRef: shortRef(clientId) },
    consents: parseJsonRows<ConsentCode>(consents),
    isExaminer: examinerId === actorId,
    isInvolved,
    /** What was concluded is there for those who may read it, and not while they check it. */
    conclusion: latest && concludedAt ? { version: latest.version, concludedAt, by: latest.by, found: isCheckerBlind || !seesReadings ? null : { speciesName: latest.speciesName, variety: latest.variety, nature: latest.nature } } : null,
    check: check ? checkView(check, { isBlind: isCheckerBlind }) : null,
    /** The viewer is making a check and has not compared it: nothing of the examination is theirs to see. */
    isCheckerBlind,
    selfCheckFrom: concludedAt && laboratory.isSolePractice && isInvolved ? selfCheckFrom({ concludedAt, delayHours: laboratory.selfCheckDelayHours }) : null,
    instruments: parseJsonRows<InstrumentRow>(instruments).map((instrument) => benchInstrument(instrument, { today, timeZone: laboratory.timeZone })),
  };
}

type ConclusionRow = { version: number; concludedAt: string; by: string; isOwn: number; speciesName: string; variety: string; nature: Nature };
type CheckRow = { version: number; kind: CheckView["kind"]; checker: string; isOwn: number; startedAt: string; comparedAt: string | null; outcome: CheckView["outcome"]; reason: string; ownSpecies: string; ownNature: Nature | null };
type InstrumentRow = {
  id: string;
  kind: InstrumentKind;
  name: string;
  description: string;
  status: "inService" | "restricted";
  resolution: string | null;
  standardUncertainty: string | null;
  upperLimit: string | null;
  prismIndex: string | null;
  scaleUnit: ScaleUnit | null;
  hasChecks: number;
  failing: string | string[] | null;
  correction: string | Correction | null;
  check: string | { referenceMaterial: string; checkedAt: string; nextDueOn: string; deviation: string | null } | null;
};

function checkView({ kind, checker, isOwn, startedAt, comparedAt, outcome, reason, ownSpecies, ownNature }: CheckRow, { isBlind }: { isBlind: boolean }): CheckView {
  return { kind, checker, isOwn: Boolean(Number(isOwn)), startedAt: new Date(startedAt), comparedAt: comparedAt ? new Date(comparedAt) : null, outcome, reason: isBlind ? "" : reason, own: ownNature && { species: ownSpecies, nature: ownNature } };
}

function benchInstrument({ id, check, ...row }: InstrumentRow, { today, timeZone }: { today: string; timeZone: string }): BenchInstrument {
  const passed = typeof check === "string" ? (JSON.parse(check) as Exclude<InstrumentRow["check"], string>) : check;
  const correction = typeof row.correction === "string" ? (JSON.parse(row.correction) as Correction) : row.correction;
  const unit = row.scaleUnit ?? scaleUnitsOf[row.kind][0];
  const reason = outOfCheck({ name: row.name, kind: row.kind, nextDueOn: passed?.nextDueOn ?? null, failing: [...new Set(parseJsonRows<string>(row.failing))], hasChecks: Boolean(Number(row.hasChecks)) }, today);
  const number = (text: string | null) => (text === null ? null : Number(text));
  return {
    ref: shortRef(id.toLowerCase() as Id<"instrument">),
    kind: row.kind,
    name: row.name,
    description: row.description,
    status: row.status,
    resolution: number(row.resolution),
    standardUncertainty: number(row.standardUncertainty),
    upperLimit: number(row.upperLimit),
    prismIndex: number(row.prismIndex),
    check: passed && { referenceMaterial: passed.referenceMaterial, checkedOn: calendarDateIn(new Date(passed.checkedAt), timeZone), nextDueOn: passed.nextDueOn, deviation: number(passed.deviation) },
    outOfCheck: reason,
    isOutOfCheck: reason !== null,
    correction: correction && unit ? { correction, unit } : null,
  };
}
