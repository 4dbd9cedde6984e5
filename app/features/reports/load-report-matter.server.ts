import { and, asc, desc, eq, isNull } from "drizzle-orm";
import {
  attachments, clients, conclusions, instrumentChecks, instruments, items, laboratories, memberships, observationStrikes, observationValues,
  observations, secondChecks, stones, stoneEvents, takeIns, users, valuationComparables, valuations,
} from "#app/db/schema/index.ts";
import type { StoneId, UserId } from "#app/domain/ids.ts";
import type { LabScope } from "#app/features/lab-context.ts";

/** Everything of one stone that a report may tell, as it stands inside the caller's transaction. */
export async function loadReportMatter(scope: LabScope, { stoneId }: { stoneId: StoneId }) {
  const { db, laboratoryId } = scope;
  const [base] = await db
    .select({ stone: stones, item: items, takeIn: takeIns, client: clients, laboratory: laboratories })
    .from(stones)
    .innerJoin(items, and(eq(items.laboratoryId, stones.laboratoryId), eq(items.id, stones.itemId)))
    .innerJoin(takeIns, and(eq(takeIns.laboratoryId, stones.laboratoryId), eq(takeIns.id, stones.takeInId)))
    .innerJoin(clients, and(eq(clients.laboratoryId, stones.laboratoryId), eq(clients.id, stones.clientId)))
    .innerJoin(laboratories, eq(laboratories.id, stones.laboratoryId))
    .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stoneId)));
  if (!base) throw new Error("the stone of a report is gone");

  const [conclusion] = await db
    .select()
    .from(conclusions)
    .where(and(eq(conclusions.laboratoryId, laboratoryId), eq(conclusions.stoneId, stoneId)))
    .orderBy(desc(conclusions.version))
    .limit(1);
  if (!conclusion) throw new Error("a checked stone has no conclusion");
  const [check] = await db
    .select()
    .from(secondChecks)
    .where(and(eq(secondChecks.laboratoryId, laboratoryId), eq(secondChecks.conclusionId, conclusion.id), eq(secondChecks.outcome, "agreed")));

  const readings = await db
    .select({ observation: observations, value: observationValues, instrument: instruments, check: instrumentChecks })
    .from(observations)
    .leftJoin(observationStrikes, and(eq(observationStrikes.laboratoryId, observations.laboratoryId), eq(observationStrikes.observationId, observations.id)))
    .leftJoin(observationValues, and(eq(observationValues.laboratoryId, observations.laboratoryId), eq(observationValues.observationId, observations.id)))
    .leftJoin(instruments, and(eq(instruments.laboratoryId, observations.laboratoryId), eq(instruments.id, observations.instrumentId)))
    .leftJoin(instrumentChecks, and(eq(instrumentChecks.laboratoryId, observations.laboratoryId), eq(instrumentChecks.id, observations.instrumentCheckId)))
    .where(and(eq(observations.laboratoryId, laboratoryId), eq(observations.stoneId, stoneId), isNull(observations.secondCheckId), isNull(observationStrikes.observationId)))
    .orderBy(asc(observations.sequence), asc(observationValues.name));

  const [valuation] = base.stone.isValuationOrdered
    ? await db
        .select()
        .from(valuations)
        .where(and(eq(valuations.laboratoryId, laboratoryId), eq(valuations.stoneId, stoneId), eq(valuations.state, "signed")))
        .orderBy(desc(valuations.version))
        .limit(1)
    : [];
  const comparables = valuation
    ? await db
        .select()
        .from(valuationComparables)
        .where(and(eq(valuationComparables.laboratoryId, laboratoryId), eq(valuationComparables.valuationId, valuation.id)))
        .orderBy(asc(valuationComparables.position))
    : [];

  const [photo] = await db
    .select({ id: attachments.id, caption: attachments.caption, createdAt: attachments.createdAt, fileKey: attachments.fileKey })
    .from(attachments)
    .where(and(eq(attachments.laboratoryId, laboratoryId), base.stone.photoId ? eq(attachments.id, base.stone.photoId) : eq(attachments.itemId, base.stone.itemId)))
    .orderBy(asc(attachments.createdAt))
    .limit(1);

  const [reopened] = await db
    .select({ why: stoneEvents.why })
    .from(stoneEvents)
    .where(and(eq(stoneEvents.laboratoryId, laboratoryId), eq(stoneEvents.stoneId, stoneId), eq(stoneEvents.fromState, "issued"), eq(stoneEvents.toState, "examining")))
    .orderBy(desc(stoneEvents.at))
    .limit(1);

  const people = await peopleOf(scope);
  return { ...base, conclusion, check, readings, valuation, comparables, photo, amendmentReason: reopened?.why ?? "", people };
}

/** Names and titles of everybody who is or was a member: a signature needs them. */
async function peopleOf({ db, laboratoryId }: LabScope): Promise<Map<UserId, { name: string; title: string }>> {
  const rows = await db
    .select({ id: users.id, name: users.name, title: memberships.title })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(eq(memberships.laboratoryId, laboratoryId));
  return new Map(rows.map(({ id, name, title }) => [id, { name, title }]));
}

export type ReportMatter = Awaited<ReturnType<typeof loadReportMatter>>;
