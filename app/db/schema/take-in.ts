import { bigint, boolean, date, foreignKey, index, int, mysqlTable, primaryKey, smallint, text, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { exactText, id, instant, jsonOf, measured } from "../columns.ts";
import type { ConsentCode } from "#app/domain/consent-code.ts";
import type { CurrencyCode } from "#app/domain/money/money.ts";
import type { Capacity, MountState, ReturnMethod, ServiceCode } from "#app/domain/take-in.ts";
import { users } from "./account.ts";
import { clients } from "./client.ts";
import { instruments } from "./instrument.ts";
import { laboratories } from "./laboratory.ts";

export const takeIns = mysqlTable(
  "take_ins",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull().references(() => laboratories.id),
    id: id<"takeIn">("id").notNull(),
    number: exactText("number", 24).notNull(),
    clientId: id<"client">("client_id").notNull(),
    handedOverBy: varchar("handed_over_by", { length: 120 }).notNull(),
    capacity: exactText<Capacity>("capacity", 12).notNull(),
    receivedAt: instant("received_at").notNull(),
    receivedBy: id<"user">("received_by").notNull().references(() => users.id),
    dueOn: date("due_on", { mode: "string" }).notNull(),
    services: jsonOf<ServiceCode[]>("services").notNull(),
    returnMethod: exactText<ReturnMethod>("return_method", 8).notNull(),
    clientStatements: text("client_statements").notNull(),
    feeAgreedAt: instant("fee_agreed_at").notNull(),
    /** Made by the form: the same form sent twice makes one take-in. */
    requestId: exactText("request_id", 36).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("take_ins_number").on(t.laboratoryId, t.number),
    uniqueIndex("take_ins_request").on(t.laboratoryId, t.requestId),
    index("take_ins_client").on(t.laboratoryId, t.clientId, t.receivedAt),
    foreignKey({ name: "take_ins_client_fk", columns: [t.laboratoryId, t.clientId], foreignColumns: [clients.laboratoryId, clients.id] }),
  ],
);

/** What was handed over, one object at a time, in neutral words. */
export const items = mysqlTable(
  "items",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"item">("id").notNull(),
    takeInId: id<"takeIn">("take_in_id").notNull(),
    position: smallint("position").notNull(),
    number: exactText("number", 24).notNull(),
    description: varchar("description", { length: 300 }).notNull(),
    stoneCount: smallint("stone_count").notNull(),
    mount: exactText<MountState>("mount", 8).notNull(),
    massValue: measured("mass_value", 12, 4).notNull(),
    massText: varchar("mass_text", { length: 24 }).notNull(),
    massUnit: exactText<"ct" | "g">("mass_unit", 2).notNull(),
    balanceId: id<"instrument">("balance_id").notNull(),
    condition: varchar("condition", { length: 1000 }).notNull(),
    /** The client's figure for custody only; examiners and the appraiser do not see it (workflow 1.2). */
    declaredValueMinor: bigint("declared_value_minor", { mode: "number" }),
    declaredCurrency: exactText<CurrencyCode>("declared_currency", 3),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("items_number").on(t.laboratoryId, t.number),
    index("items_take_in").on(t.laboratoryId, t.takeInId, t.position),
    foreignKey({ name: "items_take_in_fk", columns: [t.laboratoryId, t.takeInId], foreignColumns: [takeIns.laboratoryId, takeIns.id] }),
    foreignKey({ name: "items_balance_fk", columns: [t.laboratoryId, t.balanceId], foreignColumns: [instruments.laboratoryId, instruments.id] }),
  ],
);


export const itemConsents = mysqlTable(
  "item_consents",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    itemId: id<"item">("item_id").notNull(),
    code: exactText<ConsentCode>("code", 20).notNull(),
    isGiven: boolean("is_given").notNull(),
    recordedAt: instant("recorded_at").notNull(),
    recordedBy: id<"user">("recorded_by").notNull().references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.itemId, t.code] }),
    foreignKey({ name: "item_consents_item_fk", columns: [t.laboratoryId, t.itemId], foreignColumns: [items.laboratoryId, items.id] }),
  ],
);

export type CustodyPurpose = "received" | "toBench" | "toSafe" | "toOutside" | "fromOutside" | "release";

/** Every hand-over of an item, with a mass. Never edited: a correction is a new event. */
export const custodyEvents = mysqlTable(
  "custody_events",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"custodyEvent">("id").notNull(),
    itemId: id<"item">("item_id").notNull(),
    sequence: int("sequence").notNull(),
    purpose: exactText<CustodyPurpose>("purpose", 12).notNull(),
    fromPlace: varchar("from_place", { length: 120 }).notNull(),
    toPlace: varchar("to_place", { length: 120 }).notNull(),
    holderId: id<"user">("holder_id").references(() => users.id),
    massValue: measured("mass_value", 12, 4),
    massText: varchar("mass_text", { length: 24 }).notNull().default(""),
    massUnit: exactText<"ct" | "g">("mass_unit", 2),
    seal: varchar("seal", { length: 60 }).notNull().default(""),
    remark: varchar("remark", { length: 500 }).notNull().default(""),
    at: instant("at").notNull(),
    by: id<"user">("by").notNull().references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("custody_events_sequence").on(t.laboratoryId, t.itemId, t.sequence),
    foreignKey({ name: "custody_events_item_fk", columns: [t.laboratoryId, t.itemId], foreignColumns: [items.laboratoryId, items.id] }),
  ],
);
