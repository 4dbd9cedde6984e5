import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { openDb } from "#app/db/client.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { outgoingMail, registerEntries, reports, stoneEvents } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { authoriseReport } from "#app/features/reports/authorise-report.server.ts";
import { issueReportByNumber } from "#app/features/reports/issue-report-by-number.server.ts";
import { renderQueuedReports } from "#app/features/reports/render-queued-reports.server.ts";
import { unscopedIssueReadyReports } from "#app/features/reports/unscoped-issue-ready-reports.server.ts";
import { aCheckedStone, aReportToIssue, giveTerms, type CheckedStone } from "../../setup/checked-stone-factory.ts";
import { aLab, aMember } from "../../setup/factories.ts";
import { testDbUrl } from "../../setup/test-db.ts";
import { sized } from "../../setup/torture.ts";

// Quality bar T8.
const clientCount = 64;
const attemptCount = sized({ always: 200, whole: 2_000 });

const outcomeOf = async (attempt: Promise<unknown>) => {
  try {
    await attempt;
    return "done";
  } catch (error) {
    if (error instanceof AppError) return error.code;
    throw error;
  }
};

/** Two processes' worth of connections on the same rows. */
async function inTwoPools<Result>(ctx: LabContext, work: (contexts: readonly [LabContext, LabContext]) => Promise<Result>): Promise<Result> {
  const pools = [openDb(await testDbUrl(), { connectionLimit: 16 }), openDb(await testDbUrl(), { connectionLimit: 16 })];
  try {
    return await work([{ ...ctx, db: pools[0]!.db }, { ...ctx, db: pools[1]!.db }]);
  } finally {
    await Promise.all(pools.map((pool) => pool.close()));
  }
}

test(`of ${attemptCount} attempts by ${clientCount} at once to issue one report, one does`, async () => {
  const ctx = await aLab();
  const number = await aReportToIssue(ctx, await aCheckedStone(ctx));
  const outcomes = await inTwoPools(ctx, async (contexts) => {
    const seen: string[] = [];
    let left = attemptCount;
    await Promise.all(
      Array.from({ length: clientCount }, async (_, client) => {
        while (left-- > 0) {
          const as = contexts[client % 2]!;
          // Some press the button, some are the work in the background.
          if (client % 8 === 7) seen.push((await unscopedIssueReadyReports(as, { limit: 100 })) > 0 ? "maybe" : "conflict");
          else seen.push(await outcomeOf(issueReportByNumber(as, { number })));
        }
      }),
    );
    return seen;
  });
  expect(outcomes.filter((outcome) => outcome === "done").length).toBeLessThanOrEqual(1);
  expect(outcomes.every((outcome) => ["done", "maybe", "conflict"].includes(outcome))).toBe(true);
  const row = (await ctx.db.select().from(reports).where(and(eq(reports.laboratoryId, ctx.laboratoryId), eq(reports.number, number))))[0]!;
  expect(row.state).toBe("issued");
  expect(await ctx.db.select().from(registerEntries).where(eq(registerEntries.laboratoryId, ctx.laboratoryId))).toHaveLength(1);
  expect(await ctx.db.select().from(outgoingMail).where(and(eq(outgoingMail.laboratoryId, ctx.laboratoryId), eq(outgoingMail.kind, "reportIssued")))).toHaveLength(1);
  expect(await ctx.db.select().from(stoneEvents).where(and(eq(stoneEvents.laboratoryId, ctx.laboratoryId), eq(stoneEvents.toState, "issued")))).toHaveLength(1);
}, 120_000);

test("of two signatories at once one authorises, and no number is lost", async () => {
  const ctx = await aLab();
  const stone = await aCheckedStone(ctx);
  const outcomes = await inTwoPools(ctx, ([one, other]) => Promise.all(Array.from({ length: 16 }, (_, at) => outcomeOf(authoriseReport(at % 2 ? one : other, stone)))));
  expect(outcomes.filter((outcome) => outcome === "done")).toHaveLength(1);
  const next = await authoriseReport(ctx, await aCheckedStone(ctx));
  expect(next).toBe(`${ctx.laboratory.prefix}-R-26-00002`);
});

test("50 reports authorised and issued at once are numbered 1 to 50 without a gap or a repeat", async () => {
  const ctx = await aLab();
  const checker = await aMember(ctx, ["gemmologist"]);
  const stones: CheckedStone[] = [];
  for (let at = 0; at < 50; at++) {
    const stone = await aCheckedStone(ctx, { checker });
    await giveTerms(ctx, stone.clientId);
    stones.push(stone);
  }
  const quick: LabContext = { ...ctx, services: { ...ctx.services, reportRenderer: { render: async () => new TextEncoder().encode(`%PDF-1.7 ${newId<"report">()}`) } } };
  const numbers = await inTwoPools(quick, async (contexts) => {
    const authorised = await Promise.all(stones.map((stone, at) => authoriseReport(contexts[at % 2]!, stone)));
    await Promise.all(contexts.map((as) => renderQueuedReports(as, { limit: 1_000 })));
    await Promise.all(contexts.map((as) => renderQueuedReports(as, { limit: 1_000 })));
    await Promise.all(authorised.map((number, at) => issueReportByNumber(contexts[at % 2]!, { number })));
    return authorised;
  });
  expect(numbers.map((number) => Number(number.slice(-5))).sort((a, b) => a - b)).toEqual(Array.from({ length: 50 }, (_, at) => at + 1));
  const issued = await ctx.db.select().from(registerEntries).where(eq(registerEntries.laboratoryId, ctx.laboratoryId));
  expect(new Set(issued.map(({ code }) => code)).size).toBe(50);
}, 60_000);
