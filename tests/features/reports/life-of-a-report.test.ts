import { createHash } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { auditEvents, outgoingMail, registerEntries, reportFiles, reports, stones } from "#app/db/schema/index.ts";
import type { RegisterCode } from "#app/domain/register-code.ts";
import { recordDeskPayment } from "#app/features/invoices/record-desk-payment.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { askRegister } from "#app/features/register/ask-register.server.ts";
import { authoriseReport } from "#app/features/reports/authorise-report.server.ts";
import { getReport } from "#app/features/reports/get-report.server.ts";
import { issueReportByNumber } from "#app/features/reports/issue-report-by-number.server.ts";
import { readReportPdf } from "#app/features/reports/read-report-pdf.server.ts";
import { renderQueuedReports } from "#app/features/reports/render-queued-reports.server.ts";
import { reopenStone } from "#app/features/reports/reopen-stone.server.ts";
import { retryPdf } from "#app/features/reports/retry-pdf.server.ts";
import { unscopedIssueReadyReports } from "#app/features/reports/unscoped-issue-ready-reports.server.ts";
import { withdrawReport } from "#app/features/reports/withdraw-report.server.ts";
import { proposeConclusion } from "#app/features/identification/propose-conclusion.server.ts";
import { anApp } from "../../setup/an-app.ts";
import { aCheckedStone, agree, aReportToIssue, giveTerms } from "../../setup/checked-stone-factory.ts";
import { aConclusion } from "../../setup/conclusion-factory.ts";
import { aLab, aMember, later } from "../../setup/factories.ts";

const reportRow = async (ctx: LabContext, number: string) => (await ctx.db.select().from(reports).where(and(eq(reports.laboratoryId, ctx.laboratoryId), eq(reports.number, number))))[0]!;
const register = async (code: string) => askRegister(await anApp(), code as RegisterCode);
const stateOf = async (ctx: LabContext, stoneCode: string) => (await ctx.db.select({ state: stones.examinationState }).from(stones).where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.code, stoneCode))))[0]!.state;

test("only a checked stone's report is authorised, once, and its content is frozen", async () => {
  const ctx = await aLab();
  const stone = await aCheckedStone(ctx);
  const number = await authoriseReport(ctx, stone);
  expect(number).toBe(`${ctx.laboratory.prefix}-R-26-00001`);
  await expect(authoriseReport(ctx, stone)).rejects.toMatchObject({ code: "conflict" });
  const row = await reportRow(ctx, number);
  expect(row).toMatchObject({ state: "authorised", pdfState: "queued", version: 1 });
  expect(JSON.stringify(row.snapshot)).toContain("Curved striae");
  expect(await stateOf(ctx, stone.stoneCode)).toBe("authorised");
  // Before it is issued the register knows nothing of it.
  expect(await register(row.code!)).toBeUndefined();
});

test("a report is not issued without its PDF, nor unpaid, and goes out by itself once it is paid", async () => {
  const ctx = await aLab();
  const stone = await aCheckedStone(ctx);
  const number = await authoriseReport(ctx, stone);
  await expect(issueReportByNumber(ctx, { number })).rejects.toThrow(/still being made/);
  await renderQueuedReports(ctx, { limit: 1_000 });
  await expect(issueReportByNumber(ctx, { number })).rejects.toThrow(/not paid yet/);
  await unscopedIssueReadyReports(ctx, { limit: 1_000 });
  expect(await reportRow(ctx, number)).toMatchObject({ state: "authorised" });

  await recordDeskPayment(ctx, { number: stone.invoiceNumber, method: "transfer", reference: "bank 17" });
  await unscopedIssueReadyReports(ctx, { limit: 1_000 });
  const row = await reportRow(ctx, number);
  expect(row.state).toBe("issued");
  expect(await stateOf(ctx, stone.stoneCode)).toBe("issued");
  await expect(issueReportByNumber(ctx, { number })).rejects.toMatchObject({ code: "conflict" });

  const { pdf } = await readReportPdf(ctx, { number });
  expect(pdf.subarray(0, 5).toString()).toBe("%PDF-");
  const entry = await register(row.code!);
  expect(entry).toMatchObject({ state: "issued", pdfSha256: createHash("sha256").update(pdf).digest("hex") });
  expect(JSON.stringify(entry)).not.toMatch(/Ardenne|estate@example|650/);
  const letters = await ctx.db.select().from(outgoingMail).where(and(eq(outgoingMail.laboratoryId, ctx.laboratoryId), eq(outgoingMail.kind, "reportIssued")));
  expect(letters).toHaveLength(1);
  expect(letters[0]!.textBody).not.toMatch(/corundum|ruby/i);
});

test("a client with account terms gets the report before paying", async () => {
  const ctx = await aLab();
  const stone = await aCheckedStone(ctx);
  await giveTerms(ctx, stone.clientId);
  const number = await authoriseReport(ctx, stone);
  await renderQueuedReports(ctx, { limit: 1_000 });
  await issueReportByNumber(ctx, { number });
  expect(await reportRow(ctx, number)).toMatchObject({ state: "issued" });
});

test("a PDF that cannot be made is tried three times, then waits with its reason until somebody retries it", async () => {
  const broken = await aLab();
  const stone = await aCheckedStone(broken);
  const ctx = { ...broken, services: { ...broken.services, reportRenderer: { render: () => Promise.reject(new Error("the font is gone")) } } };
  const number = await authoriseReport(broken, stone);
  for (const minutes of [0, 1, 2, 3]) await renderQueuedReports(later(ctx, minutes * 60_000), { limit: 1_000 });
  expect(await reportRow(ctx, number)).toMatchObject({ state: "authorised", pdfState: "failed", pdfFailure: "the font is gone", pdfAttempts: 3 });
  expect(await broken.db.select().from(reportFiles).where(eq(reportFiles.laboratoryId, broken.laboratoryId))).toEqual([]);
  await expect(issueReportByNumber(ctx, { number })).rejects.toThrow(/the font is gone.*Retry/);
  await retryPdf(ctx, { number });
  await expect(retryPdf(ctx, { number })).rejects.toMatchObject({ code: "conflict" });
  await renderQueuedReports(broken, { limit: 1_000 });
  expect(await reportRow(ctx, number)).toMatchObject({ pdfState: "ready", pdfFailure: "" });
});

test("the bytes are made once: a second rendering changes nothing", async () => {
  const ctx = await aLab();
  const number = await aReportToIssue(ctx, await aCheckedStone(ctx));
  const before = await readReportPdf(ctx, { number });
  await ctx.db.update(reports).set({ pdfState: "queued", pdfAttempts: 0, pdfLeaseUntil: null }).where(and(eq(reports.laboratoryId, ctx.laboratoryId), eq(reports.number, number)));
  await renderQueuedReports(later(ctx, 60_000), { limit: 1_000 });
  expect((await readReportPdf(ctx, { number })).pdf.equals(before.pdf)).toBe(true);
});

test("a withdrawn report is withdrawn for good, and the register says when and why", async () => {
  const ctx = await aLab();
  const number = await aReportToIssue(ctx, await aCheckedStone(ctx));
  await expect(withdrawReport(ctx, { number, reason: "identityError", note: "" })).rejects.toMatchObject({ code: "conflict" });
  await issueReportByNumber(ctx, { number });
  await withdrawReport(ctx, { number, reason: "identityError", note: "the stone was swapped" });
  await expect(withdrawReport(ctx, { number, reason: "other", note: "" })).rejects.toMatchObject({ code: "conflict" });
  const { code } = await reportRow(ctx, number);
  const entry = await register(code!);
  expect(entry).toMatchObject({ state: "withdrawn", withdrawalReason: "identityError", withdrawnAt: ctx.now });
  expect(JSON.stringify(entry)).not.toContain("swapped");
  expect((await readReportPdf(ctx, { number })).pdf.byteLength).toBeGreaterThan(1_000);
  const told = await ctx.db.select().from(outgoingMail).where(and(eq(outgoingMail.laboratoryId, ctx.laboratoryId), eq(outgoingMail.kind, "reportWithdrawn")));
  expect(told).toHaveLength(1);
});

test("an amended report replaces the issued one in the same moment, and each says which", async () => {
  const ctx = await aLab();
  const stone = await aCheckedStone(ctx);
  const first = await aReportToIssue(ctx, stone);
  await issueReportByNumber(ctx, { number: first });
  await reopenStone(ctx, { stoneCode: stone.stoneCode, reason: "the variety was wrong" });
  await proposeConclusion(ctx, await aConclusion(ctx, stone, { variety: "pink sapphire" }));
  await agree(await aMember(ctx, ["gemmologist"]), stone);
  const second = await authoriseReport(ctx, stone);
  expect(await reportRow(ctx, first)).toMatchObject({ state: "issued" }); // until the new one is there
  await renderQueuedReports(ctx, { limit: 1_000 });
  await issueReportByNumber(ctx, { number: second });
  const [older, newer] = [await reportRow(ctx, first), await reportRow(ctx, second)];
  expect([older.state, newer.state, newer.version]).toEqual(["superseded", "issued", 2]);
  expect(await register(older.code!)).toMatchObject({ state: "superseded", supersededByNumber: second, supersededByCode: newer.code });
  expect(await getReport(ctx, { number: first })).toMatchObject({ supersededByNumber: second });
  expect(await getReport(ctx, { number: second })).toMatchObject({ supersedesNumber: first });
});

test("every step leaves an event with who and when", async () => {
  const ctx = await aLab();
  const number = await aReportToIssue(ctx, await aCheckedStone(ctx));
  await issueReportByNumber(ctx, { number });
  const events = await ctx.db.select({ action: auditEvents.action, actorId: auditEvents.actorId, at: auditEvents.at }).from(auditEvents).where(eq(auditEvents.laboratoryId, ctx.laboratoryId));
  for (const action of ["report.authorised", "report.issued"]) expect(events.find((event) => event.action === action)).toMatchObject({ actorId: ctx.actorId, at: ctx.now });
});

test("another laboratory's report is not found", async () => {
  const [ctx, theirs] = [await aLab(), await aLab()];
  const number = await aReportToIssue(ctx, await aCheckedStone(ctx));
  const attempts = [() => issueReportByNumber(theirs, { number }), () => getReport(theirs, { number }), () => readReportPdf(theirs, { number }), () => withdrawReport(theirs, { number, reason: "other" as const, note: "x" })];
  for (const attempt of attempts) await expect(attempt()).rejects.toMatchObject({ code: "not_found" });
  expect(await ctx.db.select().from(registerEntries).where(eq(registerEntries.laboratoryId, theirs.laboratoryId))).toEqual([]);
});
