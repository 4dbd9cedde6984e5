import { bigint, boolean, foreignKey, index, int, mysqlTable, primaryKey, smallint, uniqueIndex, varchar, date } from "drizzle-orm/mysql-core";
import { exactText, id, instant } from "../columns.ts";
import type { InvoiceState } from "#app/domain/invoice-state.ts";
import type { CurrencyCode } from "#app/domain/money/money.ts";
import type { ServiceCode } from "#app/domain/take-in.ts";
import { users } from "./account.ts";
import { clients } from "./client.ts";
import { laboratories } from "./laboratory.ts";
import { takeIns } from "./take-in.ts";

/** What a service costs. Fixed amounts only: a fee never depends on a value (workflow 1.1). */
export const prices = mysqlTable(
  "prices",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull().references(() => laboratories.id),
    id: id<"price">("id").notNull(),
    service: exactText<ServiceCode>("service", 16).notNull(),
    label: varchar("label", { length: 120 }).notNull(),
    amountMinor: bigint("amount_minor", { mode: "number" }).notNull(),
    isActive: boolean("is_active").notNull().default(true),
    position: smallint("position").notNull(),
    changedAt: instant("changed_at").notNull(),
    changedBy: id<"user">("changed_by").references(() => users.id),
  },
  (t) => [primaryKey({ columns: [t.laboratoryId, t.id] }), uniqueIndex("prices_service").on(t.laboratoryId, t.service)],
);

export const invoices = mysqlTable(
  "invoices",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"invoice">("id").notNull(),
    number: exactText("number", 24).notNull(),
    takeInId: id<"takeIn">("take_in_id").notNull(),
    clientId: id<"client">("client_id").notNull(),
    state: exactText<InvoiceState>("state", 10).notNull(),
    currency: exactText<CurrencyCode>("currency", 3).notNull(),
    netMinor: bigint("net_minor", { mode: "number" }).notNull(),
    taxMinor: bigint("tax_minor", { mode: "number" }).notNull(),
    totalMinor: bigint("total_minor", { mode: "number" }).notNull(),
    issuedOn: date("issued_on", { mode: "string" }).notNull(),
    createdAt: instant("created_at").notNull(),
    createdBy: id<"user">("created_by").notNull().references(() => users.id),
    sentAt: instant("sent_at"),
    paidAt: instant("paid_at"),
    voidedAt: instant("voided_at"),
    voidReason: varchar("void_reason", { length: 300 }).notNull().default(""),
    /** In the pay link; unguessable, unlike the number. Only its holder and the laboratory can open the pay page. */
    payToken: exactText("pay_token", 43).notNull(),
    /** The Checkout Session that is open for it, if any. */
    checkoutSessionId: exactText("checkout_session_id", 128),
    /** Counts tries at checkout; part of the idempotency key. */
    checkoutAttempt: int("checkout_attempt").notNull().default(0),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("invoices_number").on(t.laboratoryId, t.number),
    uniqueIndex("invoices_pay_token").on(t.payToken),
    index("invoices_take_in").on(t.laboratoryId, t.takeInId),
    index("invoices_state").on(t.laboratoryId, t.state, t.createdAt, t.id),
    index("invoices_created").on(t.laboratoryId, t.createdAt, t.id),
    index("invoices_client").on(t.laboratoryId, t.clientId, t.createdAt, t.id),
    foreignKey({ name: "invoices_take_in_fk", columns: [t.laboratoryId, t.takeInId], foreignColumns: [takeIns.laboratoryId, takeIns.id] }),
    foreignKey({ name: "invoices_client_fk", columns: [t.laboratoryId, t.clientId], foreignColumns: [clients.laboratoryId, clients.id] }),
  ],
);

export const invoiceLines = mysqlTable(
  "invoice_lines",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    invoiceId: id<"invoice">("invoice_id").notNull(),
    position: smallint("position").notNull(),
    service: exactText<ServiceCode>("service", 16).notNull(),
    label: varchar("label", { length: 160 }).notNull(),
    quantity: smallint("quantity").notNull(),
    unitMinor: bigint("unit_minor", { mode: "number" }).notNull(),
    netMinor: bigint("net_minor", { mode: "number" }).notNull(),
    taxShareE4: int("tax_share_e4").notNull(),
    taxMinor: bigint("tax_minor", { mode: "number" }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.invoiceId, t.position] }),
    foreignKey({ name: "invoice_lines_fk", columns: [t.laboratoryId, t.invoiceId], foreignColumns: [invoices.laboratoryId, invoices.id] }),
  ],
);

/** Money that came (positive) or went back (negative), once each: the provider's reference is unique. */
export const payments = mysqlTable(
  "payments",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"payment">("id").notNull(),
    invoiceId: id<"invoice">("invoice_id").notNull(),
    kind: exactText<"payment" | "refund">("kind", 8).notNull(),
    method: exactText<"card" | "cash" | "transfer">("method", 10).notNull(),
    amountMinor: bigint("amount_minor", { mode: "number" }).notNull(),
    currency: exactText<CurrencyCode>("currency", 3).notNull(),
    /** Payment intent or refund id at the provider; for cash and transfers the receipt's reference. */
    reference: exactText("reference", 128).notNull(),
    receivedAt: instant("received_at").notNull(),
    recordedBy: id<"user">("recorded_by").references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("payments_reference").on(t.laboratoryId, t.kind, t.reference),
    index("payments_invoice").on(t.laboratoryId, t.invoiceId),
    foreignKey({ name: "payments_invoice_fk", columns: [t.laboratoryId, t.invoiceId], foreignColumns: [invoices.laboratoryId, invoices.id] }),
  ],
);

/** Events of the payment provider by their own id, written in the transaction of their effect: a repeat has none. */
export const providerEvents = mysqlTable("provider_events", {
  eventId: exactText("event_id", 128).primaryKey(),
  type: exactText("type", 80).notNull(),
  objectId: exactText("object_id", 128).notNull(),
  laboratoryId: id<"laboratory">("laboratory_id").references(() => laboratories.id),
  effect: varchar("effect", { length: 200 }).notNull(),
  receivedAt: instant("received_at").notNull(),
});
