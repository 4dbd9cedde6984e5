import { randomUUID } from "node:crypto";
import { eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { invoices, takeIns } from "#app/db/schema/index.ts";
import type { ClientId, InvoiceId, TakeInId } from "#app/domain/ids.ts";
import type { ServiceCode } from "#app/domain/take-in.ts";
import { createInvoice } from "#app/features/invoices/create-invoice.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { aClient } from "./factories.ts";

type Options = { clientId?: ClientId; services?: ServiceCode[]; stoneCount?: number };

/** An open invoice of a take-in without items: enough for everything about money. */
export async function anInvoice(ctx: LabContext, { clientId, services = ["identification", "secondCheck"], stoneCount = 1 }: Options = {}) {
  const takeInId = newId<"takeIn">();
  await ctx.db.insert(takeIns).values({
    laboratoryId: ctx.laboratoryId,
    id: takeInId,
    number: `T-${takeInId.slice(-12)}`,
    clientId: clientId ?? (await aClient(ctx)),
    handedOverBy: "L. Ardenne",
    capacity: "executor",
    receivedAt: ctx.now,
    receivedBy: ctx.actorId,
    dueOn: "2026-12-08",
    services,
    returnMethod: "collect",
    clientStatements: "",
    feeAgreedAt: ctx.now,
    requestId: randomUUID(),
  });
  return inTransaction(ctx.db, (tx) => createInvoice({ ...ctx, db: tx }, { takeInId, stoneCount })).then((invoice) => ({ ...invoice, takeInId }));
}

export async function invoiceRow(ctx: LabContext, id: InvoiceId) {
  const [row] = await ctx.db.select().from(invoices).where(eq(invoices.id, id));
  return row!;
}

export type { TakeInId };
