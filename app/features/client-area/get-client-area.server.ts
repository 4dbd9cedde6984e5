import { and, desc, eq, inArray } from "drizzle-orm";
import { clients, clientUsers, invoices, laboratories, reports, stones } from "#app/db/schema/index.ts";
import type { UserId } from "#app/domain/ids.ts";
import { formatMoney } from "#app/domain/money/format-money.ts";
import type { AppContext } from "#app/features/app-context.ts";

const mostShown = 200;

/** Everything that is a client's own, in all laboratories that know this person: stones, invoices, reports. Three queries. */
export async function getClientArea(app: Pick<AppContext, "db">, { userId }: { userId: UserId }) {
  const isMine = eq(clientUsers.userId, userId);
  const myStones = await app.db
    .select({
      code: stones.code,
      description: stones.description,
      state: stones.examinationState,
      goodsState: stones.goodsState,
      weightText: stones.weightText,
      receivedAt: stones.receivedAt,
      dueOn: stones.dueOn,
      laboratoryName: laboratories.name,
      timeZone: laboratories.timeZone,
    })
    .from(clientUsers)
    .innerJoin(clients, and(eq(clients.laboratoryId, clientUsers.laboratoryId), eq(clients.id, clientUsers.clientId)))
    .innerJoin(stones, and(eq(stones.laboratoryId, clients.laboratoryId), eq(stones.clientId, clients.id)))
    .innerJoin(laboratories, eq(laboratories.id, clients.laboratoryId))
    .where(isMine)
    .orderBy(desc(stones.receivedAt), desc(stones.id))
    .limit(mostShown);
  const myInvoices = await app.db
    .select({
      number: invoices.number,
      state: invoices.state,
      totalMinor: invoices.totalMinor,
      currency: invoices.currency,
      issuedOn: invoices.issuedOn,
      payToken: invoices.payToken,
      laboratoryName: laboratories.name,
    })
    .from(clientUsers)
    .innerJoin(invoices, and(eq(invoices.laboratoryId, clientUsers.laboratoryId), eq(invoices.clientId, clientUsers.clientId)))
    .innerJoin(laboratories, eq(laboratories.id, invoices.laboratoryId))
    .where(isMine)
    .orderBy(desc(invoices.createdAt), desc(invoices.id))
    .limit(mostShown);
  const myReports = await app.db
    .select({
      number: reports.number,
      state: reports.state,
      kind: reports.kind,
      reportOn: reports.reportOn,
      code: reports.code,
      stoneCode: stones.code,
      description: stones.description,
      laboratoryName: laboratories.name,
    })
    .from(clientUsers)
    .innerJoin(reports, and(eq(reports.laboratoryId, clientUsers.laboratoryId), eq(reports.clientId, clientUsers.clientId)))
    .innerJoin(stones, and(eq(stones.laboratoryId, reports.laboratoryId), eq(stones.id, reports.stoneId)))
    .innerJoin(laboratories, eq(laboratories.id, reports.laboratoryId))
    .where(and(isMine, inArray(reports.state, ["issued", "superseded", "withdrawn"])))
    .orderBy(desc(reports.createdAt), desc(reports.id))
    .limit(mostShown);
  return {
    stones: myStones,
    invoices: myInvoices.map((row) => ({ ...row, total: formatMoney({ amountMinor: row.totalMinor, currency: row.currency }) })),
    reports: myReports,
  };
}
