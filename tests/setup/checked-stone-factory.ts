import { eq } from "drizzle-orm";
import { newId } from "#app/db/new-id.server.ts";
import { clients, invoices, stones } from "#app/db/schema/index.ts";
import type { ClientId } from "#app/domain/ids.ts";
import { recordDeskPayment } from "#app/features/invoices/record-desk-payment.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { authoriseReport } from "#app/features/reports/authorise-report.server.ts";
import { renderQueuedReports } from "#app/features/reports/render-queued-reports.server.ts";
import { compareSecondCheck } from "#app/features/second-checks/compare-second-check.server.ts";
import { decideSecondCheck } from "#app/features/second-checks/decide-second-check.server.ts";
import { startSecondCheck } from "#app/features/second-checks/start-second-check.server.ts";
import { aReading, corundum, type TestBench } from "./bench-factory.ts";
import { aConcludedStone } from "./conclusion-factory.ts";
import { aMember } from "./factories.ts";

export type CheckedStone = TestBench & { clientId: ClientId; invoiceNumber: string };

/** Concluded by the context's person, checked by another who agrees, not paid. */
export async function aCheckedStone(ctx: LabContext, { isValuationOrdered = false, checker }: { isValuationOrdered?: boolean; checker?: LabContext } = {}): Promise<CheckedStone> {
  const bench = await aConcludedStone(ctx);
  const other = checker ?? (await aMember(ctx, ["gemmologist"]));
  await agree(other, bench);
  if (isValuationOrdered) await ctx.db.update(stones).set({ isValuationOrdered }).where(eq(stones.id, bench.stoneId));
  const [row] = await ctx.db.select({ clientId: stones.clientId, invoiceNumber: invoices.number }).from(stones).innerJoin(invoices, eq(invoices.takeInId, stones.takeInId)).where(eq(stones.id, bench.stoneId));
  return { ...bench, clientId: row!.clientId, invoiceNumber: row!.invoiceNumber };
}

/** A second check that reads for itself and agrees. */
export async function agree(checker: LabContext, bench: TestBench): Promise<void> {
  await startSecondCheck(checker, { ...bench, requestId: newId<"secondCheck">() });
  for (const draft of [corundum.refractometer, corundum.density]) await recordReading(checker, aReading(bench, draft, { isForSecondCheck: true }));
  await compareSecondCheck(checker, { ...bench, ownSpecies: "Corundum", ownNature: "synthetic" });
  await decideSecondCheck(checker, { ...bench, outcome: "agreed", reason: "" });
}

/** Authorised, its PDF made, and paid: ready to be issued. */
export async function aReportToIssue(ctx: LabContext, stone: CheckedStone): Promise<string> {
  const number = await authoriseReport(ctx, stone);
  await renderQueuedReports(ctx, { limit: 1_000 });
  await recordDeskPayment(ctx, { number: stone.invoiceNumber, method: "cash", reference: "slip 1" });
  return number;
}

export async function giveTerms(ctx: LabContext, clientId: ClientId): Promise<void> {
  await ctx.db.update(clients).set({ terms: "account" }).where(eq(clients.id, clientId));
}
