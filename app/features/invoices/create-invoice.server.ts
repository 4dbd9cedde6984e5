import { and, eq } from "drizzle-orm";
import { newId } from "#app/db/new-id.server.ts";
import { invoiceLines, invoices, prices, takeIns } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import type { InvoiceId, TakeInId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import { newToken } from "#app/features/accounts/token.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { nextInSeries } from "#app/features/laboratories/next-in-series.server.ts";
import { feeLines } from "./fee-lines.ts";

/**
 * The invoice of a take-in, from the prices of that moment. Runs inside the transaction of the take-in, so that the fee
 * is fixed before anybody examines the stone.
 */
export async function createInvoice(ctx: LabContext, { takeInId, stoneCount }: { takeInId: TakeInId; stoneCount: number }): Promise<{ id: InvoiceId; number: string; payToken: string }> {
  const { laboratoryId, laboratory, db } = ctx;
  const [takeIn] = await db
    .select({ clientId: takeIns.clientId, services: takeIns.services })
    .from(takeIns)
    .where(and(eq(takeIns.laboratoryId, laboratoryId), eq(takeIns.id, takeInId)));
  if (!takeIn) throw new AppError("not_found", "There is no such take-in.");
  const priceList = await db
    .select({ service: prices.service, label: prices.label, amountMinor: prices.amountMinor })
    .from(prices)
    .where(and(eq(prices.laboratoryId, laboratoryId), eq(prices.isActive, true)));
  const missing = takeIn.services.find((service) => !priceList.some((price) => price.service === service));
  if (missing) throw new AppError("conflict", `The price list has no price for ${missing}. Ask an owner to add one, then take the goods in.`);

  const fee = feeLines({ services: takeIn.services, stoneCount, prices: priceList, taxShareE4: laboratory.taxShareE4, currency: laboratory.currency });
  const issuedOn = calendarDateIn(ctx.now, laboratory.timeZone);
  const year = Number(issuedOn.slice(0, 4));
  const sequence = await nextInSeries(ctx, { series: "invoice", year });
  const id = newId<"invoice">();
  const number = `${laboratory.prefix}-I-${issuedOn.slice(2, 4)}-${String(sequence).padStart(5, "0")}`;
  const payToken = newToken();
  await db.insert(invoices).values({
    laboratoryId,
    id,
    number,
    takeInId,
    clientId: takeIn.clientId,
    state: "open",
    currency: laboratory.currency,
    netMinor: fee.net.amountMinor,
    taxMinor: fee.tax.amountMinor,
    totalMinor: fee.total.amountMinor,
    issuedOn,
    createdAt: ctx.now,
    createdBy: ctx.actorId,
    payToken,
  });
  await db.insert(invoiceLines).values(
    fee.lines.map((line, index) => ({
      laboratoryId,
      invoiceId: id,
      position: index + 1,
      service: line.service,
      label: line.label,
      quantity: line.quantity,
      unitMinor: line.unit.amountMinor,
      netMinor: line.net.amountMinor,
      taxShareE4: laboratory.taxShareE4,
      taxMinor: line.tax.amountMinor,
    })),
  );
  await recordAudit(ctx, { action: "invoice.created", subject: { kind: "invoice", id }, detail: { number, totalMinor: fee.total.amountMinor } });
  return { id, number, payToken };
}
