import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { auditEvents } from "#app/db/schema/index.ts";
import { editInstrument } from "#app/features/instruments/edit-instrument.server.ts";
import { getInstrument } from "#app/features/instruments/get-instrument.server.ts";
import { listInstruments } from "#app/features/instruments/list-instruments.server.ts";
import { recordInstrumentCheck } from "#app/features/instruments/record-instrument-check.server.ts";
import { proposeConclusion } from "#app/features/identification/propose-conclusion.server.ts";
import { issueReportByNumber } from "#app/features/reports/issue-report-by-number.server.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { strikeReading } from "#app/features/readings/strike-reading.server.ts";
import { listRecall } from "#app/features/recalls/list-recall.server.ts";
import { recallForm } from "#app/features/recalls/recall-forms.server.ts";
import { workRecall } from "#app/features/recalls/work-recall.server.ts";
import { authoriseReport } from "#app/features/reports/authorise-report.server.ts";
import { getReport } from "#app/features/reports/get-report.server.ts";
import { listReports } from "#app/features/reports/list-reports.server.ts";
import { withdrawReport } from "#app/features/reports/withdraw-report.server.ts";
import { aBench, aReading, corundum } from "../../setup/bench-factory.ts";
import { aCheckedStone, aReportToIssue } from "../../setup/checked-stone-factory.ts";
import { aConclusion } from "../../setup/conclusion-factory.ts";
import { aLab, aMember, later } from "../../setup/factories.ts";
import { aCheck, aRecalledReading, aReference, failCheck } from "../../setup/instrument-factory.ts";
import { parseForm } from "../../setup/parse-form.ts";

const minuteMs = 60_000;
const dayMs = 24 * 60 * minuteMs;
const numbers = async (ctx: Parameters<typeof listRecall>[0]) => (await listRecall(ctx)).map(({ sequence }) => sequence);

test("a failed check calls back what was read since the last good one: on that instrument, by that laboratory, and not struck before", async () => {
  const [ctx, other] = [await aLab(), await aLab()];
  const bench = await aBench(ctx);
  const read = (at: number, draft: (typeof corundum)[keyof typeof corundum] = corundum.refractometer) => recordReading(later(ctx, at * minuteMs), aReading(bench, draft));
  await read(10);
  await recordInstrumentCheck(later(ctx, 20 * minuteMs), bench.instruments.refractometer, aCheck());
  await read(30);
  await read(31);
  await read(32, corundum.weight);
  await strikeReading(later(ctx, 33 * minuteMs), { stoneCode: bench.stoneCode, sequence: 3, reason: "liquid edge" });
  const theirs = await aBench(other);
  await recordReading(later(other, 30 * minuteMs), aReading(theirs, corundum.refractometer));
  expect(await listRecall(ctx)).toEqual([]);
  await failCheck(later(ctx, 60 * minuteMs), bench.instruments.refractometer);
  expect(await listRecall(later(ctx, 61 * minuteMs))).toMatchObject([{ stoneCode: bench.stoneCode, sequence: 2, kind: "refractometer", shown: "1.762 · 1.770", failedOn: "quartz", isStruck: false, reports: [], remeasured: [], done: null }]);
  expect(await listRecall(other)).toEqual([]);
  // Struck after the failure it stays, marked: only a deed takes it from the list.
  await strikeReading(later(ctx, 62 * minuteMs), { stoneCode: bench.stoneCode, sequence: 2, reason: "scale was off" });
  expect(await listRecall(ctx)).toMatchObject([{ sequence: 2, isStruck: true }]);
  expect((await listInstruments(ctx)).filter(({ isRecalling }) => isRecalling).map(({ id }) => id)).toEqual([bench.instruments.refractometer]);
});

test("the last good check is the last with the same reference; without one, the last of an earlier day; without any, all readings", async () => {
  const ctx = await aLab();
  const bench = await aBench(ctx);
  const { refractometer } = bench.instruments;
  const read = (ms: number) => recordReading(later(ctx, ms), aReading(bench, corundum.refractometer));
  const check = (ms: number, fields: Parameters<typeof aCheck>[0]) => recordInstrumentCheck(later(ctx, ms), refractometer, aCheck({ nextDueOn: "2027-01-20", ...fields }));
  const spinel = { referenceMaterial: "synthetic spinel", nominal: "1.728", reading: "1.728" };
  await read(minuteMs);
  await check(2 * minuteMs, spinel);
  await read(3 * minuteMs);
  // Of one round, the quartz passes and the spinel fails: the quartz says nothing of the time between the two rounds with the spinel.
  await check(dayMs, {});
  await check(dayMs + minuteMs, { ...spinel, reading: "1.735" });
  expect(await numbers(ctx)).toEqual([2]);

  const never = await aBench(ctx);
  await recordReading(later(ctx, minuteMs), aReading(never, corundum.refractometer));
  await recordReading(later(ctx, dayMs + minuteMs), aReading(never, corundum.refractometer));
  await recordInstrumentCheck(later(ctx, dayMs + 2 * minuteMs), never.instruments.refractometer, aCheck());
  // Its first check at all was passed in the bench's own set-up, before both: that is the last good one of an earlier day.
  await failCheck(later(ctx, dayMs + 3 * minuteMs), never.instruments.refractometer, { ...spinel, reading: "1.735" });
  expect((await listRecall(ctx)).filter(({ stoneCode }) => stoneCode === never.stoneCode).map(({ sequence }) => sequence)).toEqual([1, 2]);
});

test("a second failure calls back no reading twice, and none that was made before the first one and answered for", async () => {
  const ctx = await aLab();
  const bench = await aRecalledReading(ctx);
  await failCheck(later(ctx, 2 * 60 * minuteMs), bench.instruments.refractometer);
  expect(await numbers(ctx)).toEqual([1]);
  await workRecall(later(ctx, 3 * 60 * minuteMs), { items: [bench], deed: "accepted", reason: "The dirt came after it." });
  expect(await listRecall(ctx)).toEqual([]);
  await failCheck(later(ctx, 4 * 60 * minuteMs), bench.instruments.refractometer);
  expect(await listRecall(ctx)).toEqual([]);
});

test("readings leave the list by a deed that was done, which is kept with who and when", async () => {
  const ctx = await aLab();
  const bench = await aRecalledReading(ctx);
  const items = [{ stoneCode: bench.stoneCode, sequence: 1 }];
  await expect(workRecall(later(ctx, dayMs), { items, deed: "remeasured", reason: "" })).rejects.toMatchObject({ code: "invalid_input", fieldErrors: { deed: [expect.stringContaining("measure it again")] } });
  await expect(workRecall(later(ctx, dayMs), { items, deed: "reportWithdrawn", reason: "" })).rejects.toMatchObject({ code: "invalid_input", fieldErrors: { deed: [expect.stringContaining("No report")] } });
  const second = await aBench(ctx);
  await recordReading(later(ctx, dayMs), { ...aReading(bench, corundum.refractometer), instrumentId: second.instruments.refractometer });
  expect(await listRecall(ctx)).toMatchObject([{ sequence: 1, remeasured: [2] }]);
  await workRecall(later(ctx, dayMs + minuteMs), { items, deed: "remeasured", reason: "same within 0.001" });
  expect(await listRecall(ctx)).toEqual([]);
  expect(await listRecall(ctx, { show: "done" })).toMatchObject([{ stoneCode: bench.stoneCode, sequence: 1, done: { deed: "remeasured", reason: "same within 0.001", by: ctx.person.name, at: new Date(ctx.now.getTime() + dayMs + minuteMs) } }]);
  expect(await ctx.db.select({ by: auditEvents.actorId, reason: auditEvents.reason }).from(auditEvents).where(and(eq(auditEvents.laboratoryId, ctx.laboratoryId), eq(auditEvents.action, "reading.recallSettled")))).toEqual([{ by: ctx.actorId, reason: "same within 0.001" }]);
  await expect(workRecall(later(ctx, dayMs + 2 * minuteMs), { items, deed: "accepted", reason: "once more, please" })).rejects.toMatchObject({ code: "conflict" });
});

test("all of a form's readings are answered for, or none", async () => {
  const ctx = await aLab();
  const bench = await aRecalledReading(ctx);
  await expect(workRecall(later(ctx, dayMs), { items: [{ stoneCode: bench.stoneCode, sequence: 1 }, { stoneCode: bench.stoneCode, sequence: 7 }], deed: "accepted", reason: "The block was dirty." })).rejects.toMatchObject({ code: "not_found" });
  expect(await numbers(ctx)).toEqual([1]);
});

test("two people who answer for one reading at once leave one deed", async () => {
  const ctx = await aLab();
  const bench = await aRecalledReading(ctx);
  const colleague = await aMember(ctx, ["gemmologist"]);
  const work = { items: [{ stoneCode: bench.stoneCode, sequence: 1 }], deed: "accepted" as const, reason: "The block was dirty." };
  const outcomes = await Promise.allSettled([workRecall(later(ctx, dayMs), work), workRecall(later(colleague, dayMs), work)]);
  expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  expect(await listRecall(ctx, { show: "done" })).toHaveLength(1);
});

test("an issued report that relies on a reading called back is flagged, until it is withdrawn", async () => {
  const ctx = await aLab();
  const bench = await aCheckedStone(ctx);
  const number = await aReportToIssue(ctx, bench);
  await issueReportByNumber(ctx, { number });
  expect((await listReports(ctx, {})).reports).toMatchObject([{ number, isRecalled: false }]);
  await failCheck(later(ctx, dayMs), bench.instruments.refractometer);
  // The examiner's reading and the checker's, which the signature rests on.
  const items = [1, 4].map((sequence) => ({ stoneCode: bench.stoneCode, sequence }));
  expect(await listRecall(ctx)).toMatchObject(items.map((item) => ({ ...item, reports: [{ number, state: "issued" }] })));
  expect((await listReports(ctx, {})).reports).toMatchObject([{ number, isRecalled: true }]);
  expect((await getReport(ctx, { number })).recalled).toMatchObject([{ sequence: 1, failedOn: "quartz" }, { sequence: 4 }]);
  await expect(workRecall(later(ctx, dayMs + minuteMs), { items, deed: "reportWithdrawn", reason: "" })).rejects.toMatchObject({ fieldErrors: { deed: [expect.stringContaining(`${number} still stands`)] } });
  await withdrawReport(later(ctx, dayMs + 2 * minuteMs), { number, reason: "identityError", note: "instrument was off" });
  await workRecall(later(ctx, dayMs + 3 * minuteMs), { items, deed: "reportWithdrawn", reason: "" });
  expect(await listRecall(ctx)).toEqual([]);
  expect((await getReport(ctx, { number })).recalled).toEqual([]);
});

test("a report is not authorised while it would rely on a reading called back", async () => {
  const ctx = await aLab();
  const bench = await aCheckedStone(ctx);
  await failCheck(later(ctx, dayMs), bench.instruments.refractometer);
  await expect(authoriseReport(later(ctx, 2 * dayMs), bench)).rejects.toMatchObject({ code: "conflict", userMessage: expect.stringContaining("recall list") });
  await workRecall(later(ctx, 2 * dayMs), { items: [1, 4].map((sequence) => ({ stoneCode: bench.stoneCode, sequence })), deed: "accepted", reason: "A reading on another instrument agrees." });
  await expect(authoriseReport(later(ctx, 2 * dayMs), bench)).resolves.toMatch(/-R-/);
});

test("“identified” is refused on an instrument that is out of check, and says which reading, which instrument and what to do", async () => {
  const ctx = await aLab();
  const bench = await aBench(ctx);
  const overdue = later(ctx, 10 * dayMs);
  const { warnings } = await recordReading(overdue, aReading(bench, corundum.refractometer));
  expect(warnings).toEqual([expect.stringMatching(/was due on 8 December 2026\..*“identified”/)]);
  await recordReading(overdue, aReading(bench, corundum.free));
  const { name } = await getInstrument(ctx, bench.instruments.refractometer);
  expect((await listReadings(overdue, bench)).map(({ doubt }) => doubt?.because ?? null)).toEqual(["overdue", null]);
  await expect(proposeConclusion(overdue, await aConclusion(ctx, bench))).rejects.toMatchObject({
    code: "invalid_input",
    fieldErrors: { confidence: [`“Identified” cannot rest on reading 1 (refractometer on ${name}). The check of ${name} was due on 8 December 2026. Check ${name}, or measure again on an instrument in check and strike this reading, or conclude otherwise than “Identified”.`] },
  });
  // Each of the three ways out. Otherwise:
  await expect(proposeConclusion(overdue, await aConclusion(ctx, bench, { confidence: "consistentWith" }))).resolves.toBeUndefined();
});

test("a check passed later vouches for a reading made while it was overdue, and striking it does as well", async () => {
  const ctx = await aLab();
  const [checked, struck] = [await aBench(ctx), await aBench(ctx)];
  const overdue = later(ctx, 10 * dayMs);
  for (const bench of [checked, struck]) for (const draft of [corundum.refractometer, corundum.free]) await recordReading(overdue, aReading(bench, draft));
  await recordInstrumentCheck(later(ctx, 11 * dayMs), checked.instruments.refractometer, aCheck());
  await proposeConclusion(later(ctx, 11 * dayMs), await aConclusion(ctx, checked));
  await strikeReading(overdue, { stoneCode: struck.stoneCode, sequence: 1, reason: "out of check" });
  await recordReading(overdue, { ...aReading(struck, corundum.refractometer), instrumentId: checked.instruments.refractometer });
  await recordInstrumentCheck(later(ctx, 12 * dayMs), checked.instruments.refractometer, aCheck());
  await proposeConclusion(later(ctx, 12 * dayMs), await aConclusion(ctx, struck));
});

test("a reading called back blocks “identified” until somebody answers for it, whatever is passed since", async () => {
  const ctx = await aLab();
  const bench = await aRecalledReading(ctx);
  await recordReading(later(ctx, dayMs), aReading(bench, corundum.free));
  await recordInstrumentCheck(later(ctx, dayMs), bench.instruments.refractometer, aCheck());
  expect((await listReadings(ctx, bench))[0]!.doubt).toMatchObject({ because: "failedAfter", text: expect.stringContaining("failed its check with quartz on 1 December 2026") });
  await expect(proposeConclusion(later(ctx, dayMs), await aConclusion(ctx, bench))).rejects.toMatchObject({ fieldErrors: { confidence: [expect.stringContaining("recall list")] } });
  await workRecall(later(ctx, 2 * dayMs), { items: [{ stoneCode: bench.stoneCode, sequence: 1 }], deed: "accepted", reason: "The block was dirty, not the scale." });
  await proposeConclusion(later(ctx, 2 * dayMs), await aConclusion(ctx, bench));
});

test("an instrument that is only weighed on, or that the eye judges and was never checked, does not block the identity", async () => {
  const ctx = await aLab();
  const bench = await aBench(ctx);
  const overdue = later(ctx, 10 * dayMs);
  await recordInstrumentCheck(overdue, bench.instruments.refractometer, aCheck());
  for (const draft of [corundum.refractometer, corundum.weight, corundum.dimensions, corundum.free]) await recordReading(overdue, aReading(bench, draft));
  expect((await listReadings(overdue, bench)).map(({ doubt }) => doubt?.because ?? null)).toEqual([null, "overdue", "overdue", null]);
  await proposeConclusion(overdue, await aConclusion(ctx, bench));
});

test("a failing instrument comes back into service only after a passed check with what it failed on", async () => {
  const ctx = await aLab();
  const bench = await aRecalledReading(ctx);
  const { refractometer: id } = bench.instruments;
  const { checks: _, corrections: __, ref: ___, unit: ____, usualDays: _____, outOfCheck, isRecalling, status, createdAt: ______, id: _______, ...fields } = await getInstrument(ctx, id);
  expect({ outOfCheck, isRecalling, status }).toEqual({ outOfCheck: expect.stringContaining("failed its last check with quartz"), isRecalling: true, status: "outOfService" });
  const edit = { ...fields, status: "inService" as const, statusReason: "" };
  await recordInstrumentCheck(later(ctx, dayMs), id, aCheck({ referenceMaterial: "synthetic spinel", nominal: "1.728", reading: "1.728" }));
  await expect(editInstrument(later(ctx, dayMs), id, edit)).rejects.toMatchObject({ code: "conflict", fieldErrors: { status: [expect.stringContaining("quartz")] } });
  await recordInstrumentCheck(later(ctx, dayMs + minuteMs), id, aCheck());
  await editInstrument(later(ctx, dayMs + 2 * minuteMs), id, edit);
  expect(await getInstrument(ctx, id)).toMatchObject({ status: "inService", outOfCheck: null });
});

test("the recall list is for those who read readings, and worked by those who keep the instruments", async () => {
  const [ctx, other] = [await aLab(), await aLab()];
  const bench = await aRecalledReading(ctx);
  const work = { items: [{ stoneCode: bench.stoneCode, sequence: 1 }], deed: "accepted" as const, reason: "The block was dirty." };
  await expect(listRecall(await aMember(ctx, ["desk"]))).rejects.toMatchObject({ code: "forbidden" });
  await expect(workRecall(await aMember(ctx, ["appraiser"]), work)).rejects.toMatchObject({ code: "forbidden" });
  await expect(workRecall(other, work)).rejects.toMatchObject({ code: "not_found" });
  expect(await listRecall(await aMember(ctx, ["appraiser"]))).toHaveLength(1);
});

test("a check with a reference of the list takes its value and limit; a retired or another kind's is refused at its field", async () => {
  const ctx = await aLab();
  const bench = await aBench(ctx);
  const { refractometer, polariscope } = bench.instruments;
  const referenceId = await aReference(ctx);
  const check = (fields: object) => recordInstrumentCheck(ctx, refractometer, { ...aCheck({ reading: "1.546" }), nominal: null, limit: null, referenceMaterial: "", ...fields });
  expect(await check({ referenceId })).toEqual({ isPassed: true });
  expect((await getInstrument(ctx, refractometer)).checks.find(({ readingText }) => readingText === "1.546")).toMatchObject({ referenceMaterial: "Quartz Q1, ordinary ray", nominalValue: 1.5442, limitValue: 0.002 });
  const weight = await aReference(ctx, { name: "Check weight 5 ct", forKind: "balance", unit: "ct", nominalValue: 5, limitValue: 0.003 });
  await expect(check({ referenceId: weight })).rejects.toMatchObject({ fieldErrors: { reference: [expect.stringContaining("another kind")] } });
  await expect(check({ referenceId: await aReference(await aLab()) })).rejects.toMatchObject({ fieldErrors: { reference: [expect.stringContaining("this laboratory")] } });
  // What the eye judges.
  const glass = await aReference(ctx, { name: "Glass", forKind: "polariscope", unit: null, nominalValue: null, limitValue: null, expectedText: "dark throughout" });
  const seen = { ...aCheck(), referenceId: glass, nominal: null, reading: null, limit: null, seen: { text: "blinks", isAsExpected: false } };
  expect(await recordInstrumentCheck(later(ctx, minuteMs), polariscope, seen)).toEqual({ isPassed: false });
});

test.each([
  [{ deed: "accepted", reason: "Long enough a reason." }, "items"],
  [{ items: "MQ-26-0001-1/1", deed: "accepted", reason: "" }, "reason"],
  [{ items: "MQ-26-0001-1/1", deed: "accepted", reason: "fine" }, "reason"],
  [{ items: "MQ-26-0001-1/1", deed: "forgotten", reason: "Long enough a reason." }, "deed"],
  [{ items: "MQ-26-0001-1/1", reason: "Long enough a reason." }, "deed"],
  [{ items: "../../etc", deed: "remeasured" }, "items[0]"],
  [{ items: "MQ-26-0001-1/1", deed: "accepted", reason: "x".repeat(2000) }, "reason"],
])("a deed of %o is refused at %s", (fields, field) => {
  expect(Object.keys(parseForm(recallForm, fields as Record<string, string>).error ?? {})).toContain(field);
});
