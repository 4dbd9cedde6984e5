import { boolean, date, foreignKey, index, int, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { exactText, id, instant, measured } from "../columns.ts";
import type { InstrumentKind } from "#app/domain/instrument-kind.ts";
import { users } from "./account.ts";
import { laboratories } from "./laboratory.ts";

export const instruments = mysqlTable(
  "instruments",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull().references(() => laboratories.id),
    id: id<"instrument">("id").notNull(),
    kind: exactText<InstrumentKind>("kind", 20).notNull(),
    /** The laboratory's own short name, as on its label: R2, B1. */
    name: varchar("name", { length: 40 }).notNull(),
    description: varchar("description", { length: 200 }).notNull().default(""),
    serial: varchar("serial", { length: 80 }).notNull().default(""),
    location: varchar("location", { length: 80 }).notNull().default(""),
    status: exactText<"inService" | "restricted" | "outOfService">("status", 12).notNull().default("inService"),
    statusReason: varchar("status_reason", { length: 300 }).notNull().default(""),
    /** Smallest step that is read, in the instrument's own unit. */
    resolution: measured("resolution", 12, 6),
    /** Standard uncertainty of one reading in the laboratory's own study; null: the default for the kind. */
    standardUncertainty: measured("standard_uncertainty", 12, 6),
    /** Refractometers: the highest index that the contact liquid lets be read. */
    upperLimit: measured("upper_limit", 12, 6),
    /** Angle refractometers: index of the prism at 589.3 nm. */
    prismIndex: measured("prism_index", 12, 6),
    createdAt: instant("created_at").notNull(),
    version: int("version").notNull().default(1),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("instruments_name").on(t.laboratoryId, t.name),
  ],
);

export const instrumentChecks = mysqlTable(
  "instrument_checks",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"instrumentCheck">("id").notNull(),
    instrumentId: id<"instrument">("instrument_id").notNull(),
    referenceMaterial: varchar("reference_material", { length: 120 }).notNull(),
    nominalValue: measured("nominal_value", 14, 6).notNull(),
    readingValue: measured("reading_value", 14, 6).notNull(),
    readingText: varchar("reading_text", { length: 24 }).notNull(),
    limitValue: measured("limit_value", 14, 6).notNull(),
    isPassed: boolean("is_passed").notNull(),
    tempC: measured("temp_c", 5, 1),
    note: varchar("note", { length: 500 }).notNull().default(""),
    nextDueOn: date("next_due_on", { mode: "string" }).notNull(),
    checkedAt: instant("checked_at").notNull(),
    checkedBy: id<"user">("checked_by").notNull().references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    index("instrument_checks_instrument").on(t.laboratoryId, t.instrumentId, t.checkedAt),
    foreignKey({ name: "instrument_checks_fk", columns: [t.laboratoryId, t.instrumentId], foreignColumns: [instruments.laboratoryId, instruments.id] }),
  ],
);
