import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { clientUsers, reports } from "#app/db/schema/index.ts";
import type { RegisterCode } from "#app/domain/register-code.ts";
import { getClientArea } from "#app/features/client-area/get-client-area.server.ts";
import { readMyReportPdf } from "#app/features/client-area/read-my-report-pdf.server.ts";
import { issueReportByNumber } from "#app/features/reports/issue-report-by-number.server.ts";
import { anApp, aPerson } from "../../setup/an-app.ts";
import { aCheckedStone, aReportToIssue } from "../../setup/checked-stone-factory.ts";
import { aLab } from "../../setup/factories.ts";

test("a client sees their own stones, invoices and issued reports, and no other client's", async () => {
  const app = await anApp();
  const [mine, notMine] = [await aLab(), await aLab()];
  const [me, stranger] = [await aPerson(app), await aPerson(app)];
  const stone = await aCheckedStone(mine);
  await mine.db.insert(clientUsers).values({ laboratoryId: mine.laboratoryId, clientId: stone.clientId, userId: me.userId, joinedAt: mine.now });
  const number = await aReportToIssue(mine, stone);
  const codeOf = async () => (await mine.db.select({ code: reports.code }).from(reports).where(eq(reports.laboratoryId, mine.laboratoryId)))[0]!.code as RegisterCode;

  // Authorised is not issued: there is nothing to fetch yet.
  expect((await getClientArea(app, me)).reports).toEqual([]);
  await expect(readMyReportPdf(app, { userId: me.userId, code: await codeOf() })).rejects.toMatchObject({ code: "not_found" });

  await issueReportByNumber(mine, { number });
  await aCheckedStone(notMine);
  const area = await getClientArea(app, me);
  expect(area.stones.map(({ code }) => code)).toEqual([stone.stoneCode]);
  expect(area.invoices.map((invoice) => invoice.number)).toEqual([stone.invoiceNumber]);
  expect(area.reports.map((report) => report.number)).toEqual([number]);
  expect((await readMyReportPdf(app, { userId: me.userId, code: await codeOf() })).pdf.subarray(0, 5).toString()).toBe("%PDF-");

  expect(await getClientArea(app, stranger)).toMatchObject({ stones: [], invoices: [], reports: [] });
  await expect(readMyReportPdf(app, { userId: stranger.userId, code: await codeOf() })).rejects.toMatchObject({ code: "not_found" });
});
